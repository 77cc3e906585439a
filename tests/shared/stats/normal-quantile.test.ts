import fc from "fast-check";
import { expect, test } from "vitest";
import { normalQuantile } from "#shared/stats/normal-quantile.ts";

// Wichura (1988), Applied Statistics 37(3): check values of PPND16 (from memory; root finding at 40 digits confirms them).
test.each([
  [0.25, -0.6744897501960817],
  [0.001, -3.090232306167814],
  [1e-20, -9.262340089798409],
])("gives the check value of AS 241 at %d", (p, z) => {
  expect(Math.abs(normalQuantile(p) / z - 1)).toBeLessThan(1e-15);
});

test("mirrors about one half and rises", () => {
  fc.assert(
    fc.property(fc.double({ min: 0.001, max: 0.5, noNaN: true }), (p) => {
      expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 12);
      expect(normalQuantile(p * 0.999)).toBeLessThan(normalQuantile(p));
    }),
  );
  expect(normalQuantile(0.5)).toBe(0);
});

test.each([0, 1, -0.1, 1.1, Number.NaN])("refuses %d", (p) => {
  expect(() => normalQuantile(p)).toThrow(RangeError);
});
