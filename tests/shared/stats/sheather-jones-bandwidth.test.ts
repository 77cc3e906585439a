import fc from "fast-check";
import { expect, test } from "vitest";
import { sheatherJonesBandwidth } from "#shared/stats/sheather-jones-bandwidth.ts";
import reference from "#tests/data/kernel-density.json" with { type: "json" };

// Sheather and Jones (1991); R 4.2.2 bw.SJ(method = "ste") with its tolerance set to nothing, 15 digits. R's own default
// tolerance is a tenth of the lower limit, which is why its usual output differs in the third digit.
test.each(Object.entries(reference.datasets))("equals R's bw.SJ of %s", (_, { x, SJ_ste, SJ_ste_default_tol }) => {
  expect(Math.abs(sheatherJonesBandwidth(x) / SJ_ste - 1)).toBeLessThan(1e-8);
  expect(Math.abs(sheatherJonesBandwidth(x) / SJ_ste_default_tol - 1)).toBeLessThan(0.01);
});

test("follows a change of unit, and barely notices a change of zero", () => {
  const { x } = reference.datasets.precip;
  const bandwidth = sheatherJonesBandwidth(x);
  fc.assert(
    fc.property(
      fc.double({ min: 0.001, max: 1000, noNaN: true }),
      fc.double({ min: -500, max: 500, noNaN: true }),
      (factor, shift) => {
        // rounding may move single values across a bin's edge
        expect(Math.abs(sheatherJonesBandwidth(x.map((v) => v * factor)) / factor / bandwidth - 1)).toBeLessThan(0.003);
        expect(Math.abs(sheatherJonesBandwidth(x.map((v) => v + shift)) / bandwidth - 1)).toBeLessThan(0.01);
      },
    ),
    { numRuns: 20 },
  );
});

test.each([
  [[]],
  [[1]],
  [[2, 2, 2, 2]],
  [[1, 2, 2, 2, 2, 2, 9]],
  [[1, 2, Number.NaN]],
  [[1, 2, Number.NEGATIVE_INFINITY]],
])("refuses %j", (x) => {
  expect(() => sheatherJonesBandwidth(x)).toThrow(RangeError);
});
