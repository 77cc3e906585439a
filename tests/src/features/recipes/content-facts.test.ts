import { expect, test } from "vitest";
import { sampleContent } from "#tests/support/recipe-samples.ts";
import { changeLine, contentChanges } from "../../../../src/features/recipes/content-facts.ts";

const names = (id: string) => (id === sampleContent().machineId ? "Long table" : "Old table");

function lines(after: Parameters<typeof sampleContent>, units: "metric" | "inch" = "metric") {
  return contentChanges(sampleContent({}, { feedMmMin: 2310 }), sampleContent(...after), units, names).map(changeLine);
}

test("a changed figure says its unit once", () => {
  expect(lines([{}, { feedMmMin: 2450 }])).toEqual(["Feed rate 2,310 → 2,450 mm/min"]);
});

test("figures are in the member's unit", () => {
  // 2,310 / 25.4 = 90.94, 2,450 / 25.4 = 96.46
  expect(lines([{}, { feedMmMin: 2450 }], "inch")).toEqual(["Feed rate 90.9 → 96.5 in/min"]);
});

test("what was filled in or emptied says so", () => {
  expect(lines([{ grade: "" }, { feedMmMin: 2310, kerfWidthMm: null }])).toEqual([
    "Grade S235 → not set",
    "Kerf width 1.45 mm → not set",
  ]);
});

test("gauge thicknesses keep their words, machines their names", () => {
  expect(
    lines([{ thicknessMm: 3.175, machineId: "0b6f0d0e-0000-4000-8000-000000000012" }, { feedMmMin: 2310 }], "inch"),
  ).toEqual(["Machine Long table → Old table", "Thickness 0.118 in → 1/8 in"]);
});

test("a note is never quoted in the history", () => {
  expect(lines([{ note: "Slats turned" }, { feedMmMin: 2310 }])).toEqual(["Note to self added"]);
});

test("nothing changed, nothing listed", () => {
  expect(lines([{}, { feedMmMin: 2310 }])).toEqual([]);
});
