import fc from "fast-check";
import { expect, test } from "vitest";
import { compensatedDot } from "#shared/stats/compensated-dot.ts";

test("keeps what plain products and sums lose", () => {
  expect(compensatedDot(0, [1e16, 1, -1e16], [1, 0.5, 1])).toBe(0.5);
  // (1 + e)(1 - e) - 1 = -e^2, which a rounded product gives as 0
  const e = 2 ** -30;
  expect(compensatedDot(-1, [1 + e], [1 - e])).toBe(-(e ** 2));
});

test("equals exact integer arithmetic far beyond 2^53", () => {
  const factors = fc.array(fc.tuple(fc.maxSafeInteger(), fc.integer({ min: -1000, max: 1000 })), { maxLength: 20 });
  fc.assert(
    fc.property(factors, (pairs) => {
      const exact = pairs.reduce((sum, [a, b]) => sum + BigInt(a) * BigInt(b), 0n);
      const got = compensatedDot(
        0,
        pairs.map(([a]) => a),
        pairs.map(([, b]) => b),
      );
      expect(Math.abs(got - Number(exact))).toBeLessThanOrEqual(Math.abs(Number(exact)) * 2 ** -52);
    }),
  );
});
