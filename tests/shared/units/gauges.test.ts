import { describe, expect, test } from "vitest";
import { materials } from "#shared/materials/materials.ts";
import { gaugeRange, gaugeThicknessMm, nearestGauge } from "#shared/units/gauges.ts";
import published from "../../data/sheet-gauges.json" with { type: "json" };

const printedInMm = (inches: number) => inches * 25.4;

describe.each(published.rows)("gauge $gauge", ({ gauge, mildSteelIn, galvanisedIn, stainlessIn, brownSharpeIn }) => {
  test.each([
    ["mild-steel", mildSteelIn],
    ["galvanised-steel", galvanisedIn],
    ["stainless-steel", stainlessIn],
    ["aluminium", brownSharpeIn],
    ["copper", brownSharpeIn],
    ["brass", brownSharpeIn],
  ] as const)("of %s is the printed thickness, to one in its last place", (material, printed) => {
    // Printed to 0.0001 in; a column without a printed value begins at a later gauge.
    if (printed === null) expect(gaugeThicknessMm(material, gauge)).toBeNull();
    else expect(Math.abs(gaugeThicknessMm(material, gauge)! - printedInMm(printed))).toBeLessThan(printedInMm(0.0001));
  });
});

describe.each(materials)("gauges of %s", (material) => {
  const { min, max } = gaugeRange(material);
  const numbers = Array.from({ length: max - min + 1 }, (_, i) => min + i);

  test("grow thinner with their number", () => {
    const thicknesses = numbers.map((gauge) => gaugeThicknessMm(material, gauge)!);
    expect(thicknesses).toEqual([...new Set(thicknesses)].sort((a, b) => b - a));
  });

  test("are found again by their thickness", () => {
    expect(numbers.map((gauge) => nearestGauge(material, gaugeThicknessMm(material, gauge)!))).toEqual(numbers);
  });

  test.each([min - 1, max + 1, 11.5, Number.NaN])("do not include %d", (gauge) => {
    expect(gaugeThicknessMm(material, gauge)).toBeNull();
  });
});

test("a thickness between gauges has none", () => {
  expect(nearestGauge("mild-steel", 3.2)).toBeNull();
  expect(nearestGauge("mild-steel", 3.03)).toBe(11);
  expect(nearestGauge("mild-steel", 3.03, 0.001)).toBeNull();
});
