import { describe, expect, test } from "vitest";
import { materials } from "#shared/materials/materials.ts";
import { cautionsFor } from "#shared/safety/cautions.ts";
import { minimumShade } from "#shared/safety/eye-protection.ts";

// 29 CFR 1910.133(a)(5), plasma arc cutting: light (under 300 A) 8, medium (300-400 A) 9, heavy (400-800 A) 10.
describe("filter shade", () => {
  test.each([
    [20, 8],
    [299.5, 8],
    [300, 9],
    [399, 9],
    [400, 10],
    [800, 10],
  ])("%d A needs at least shade %d", (currentA, shade) => {
    expect(minimumShade(currentA)).toBe(shade);
  });

  test.each([0, 801, Number.NaN])("refuses %d A, which the table does not hold", (currentA) => {
    expect(() => minimumShade(currentA)).toThrow(RangeError);
  });
});

describe("cautions", () => {
  const textOf = (subject: Parameters<typeof cautionsFor>[0]) =>
    cautionsFor(subject)
      .map((c) => `${c.title} ${c.text} ${c.standards.join(" ")}`)
      .join("\n");

  test.each(materials)("%s carries eyes, fume, mains and arc voltage, fire, gas and manual", (material) => {
    const text = textOf({ material, gas: "air", currentA: 45 });
    for (const word of [
      "shade 8",
      "fume extraction",
      "chlorinated",
      "Mains and arc voltage kill",
      "fire watch",
      "Compressed gas",
      "manual",
      "local codes",
      "qualified people",
      "no instruction",
    ]) {
      expect(text).toContain(word);
    }
  });

  test("stainless names chromium VI, galvanised zinc, aluminium hydrogen", () => {
    expect(textOf({ material: "stainless-steel", gas: "air", currentA: 45 })).toMatch(
      /chromium VI[\s\S]*29 CFR 1910\.1026/,
    );
    expect(textOf({ material: "galvanised-steel", gas: "air", currentA: 45 })).toContain("zinc");
    expect(textOf({ material: "aluminium", gas: "air", currentA: 45 })).toContain("hydrogen in a water table");
    expect(textOf({ material: "mild-steel", gas: "air", currentA: 45 })).not.toMatch(/chromium|zinc|hydrogen/);
  });

  test("a process gas brings its own", () => {
    expect(textOf({ material: "aluminium", gas: "argon-hydrogen", currentA: 100 })).toContain("The mixture burns");
    expect(textOf({ material: "mild-steel", gas: "oxygen", currentA: 100 })).toContain("Oil and grease");
  });

  test("without a known current every class of the table is named", () => {
    expect(textOf({ material: "mild-steel", gas: "air", currentA: null })).toContain("9 from 300 A, 10 from 400 A");
  });

  test("no caution appears twice", () => {
    const ids = cautionsFor({ material: "aluminium", gas: "argon-hydrogen", currentA: 45 }).map((c) => c.id);
    expect(new Set(ids).size).toBe(ids.length);
  });
});
