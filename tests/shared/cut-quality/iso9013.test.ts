import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { perpendicularityRange, roughnessRange } from "#shared/cut-quality/iso9013.ts";
import published from "../../data/iso9013.json" with { type: "json" };

// ISO 9013:2017; the data file says which limits are second-hand and which are from memory.
const scale = { mm: 0.000_1, um: 0.01 };

describe.each(published.values)("ISO 9013 at $a mm", ({ a, uMm, rz5Um }) => {
  test("a u on a limit belongs to that range, one above it to the next", () => {
    expect(uMm.map((limit) => perpendicularityRange(limit, a))).toEqual([1, 2, 3, 4, 5]);
    expect(uMm.map((limit) => perpendicularityRange(limit + scale.mm, a))).toEqual([2, 3, 4, 5, "outside"]);
  });

  test("an Rz5 on a limit belongs to that range, one above it to the next", () => {
    expect(rz5Um.map((limit) => roughnessRange(limit, a))).toEqual([1, 2, 3, 4]);
    expect(rz5Um.map((limit) => roughnessRange(limit + scale.um, a))).toEqual([2, 3, 4, "outside"]);
  });
});

test("the limits of u at 3 mm agree with the printed ones to their two decimals", () => {
  const half = 0.005;
  for (const [i, printed] of published.printedAt3mm.uMm.entries()) {
    expect(perpendicularityRange(printed - half, 3)).toBe(i + 1);
    expect(perpendicularityRange(printed + half, 3)).toBe(i + 2);
  }
});

test.each([
  [0.1, 0.499],
  [0.1, 150.1],
  [0.1, Number.NaN],
  [-0.1, 6],
  [Number.NaN, 6],
])("says nothing of %d at %d mm, where the standard does not apply", (measured, a) => {
  expect(perpendicularityRange(measured, a)).toBeNull();
  expect(roughnessRange(measured, a)).toBeNull();
});

test("covers plasma cuts from 0.5 to 150 mm, ends included", () => {
  expect([0.5, 150].map((a) => perpendicularityRange(0, a))).toEqual([1, 1]);
});

test("a worse face never gets a better range, thicker metal never a worse one", () => {
  const rank = (range: number | "outside" | null) => (range === "outside" ? 9 : range!); // within the scope
  const thickness = fc.double({ min: 0.5, max: 150, noNaN: true });
  const measured = fc.double({ min: 0, max: 600, noNaN: true });
  fc.assert(
    fc.property(thickness, thickness, measured, measured, (a, b, x, y) => {
      const [thin, thick, fine, coarse] = [Math.min(a, b), Math.max(a, b), Math.min(x, y), Math.max(x, y)];
      expect(rank(roughnessRange(fine, thin))).toBeLessThanOrEqual(rank(roughnessRange(coarse, thin)));
      expect(rank(roughnessRange(fine, thick))).toBeLessThanOrEqual(rank(roughnessRange(fine, thin)));
      expect(rank(perpendicularityRange(fine / 100, thick))).toBeLessThanOrEqual(
        rank(perpendicularityRange(fine / 100, thin)),
      );
    }),
  );
});
