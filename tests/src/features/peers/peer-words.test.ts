import { expect, test } from "vitest";
import { peerGroupOf } from "#shared/peers/peer-group.ts";
import {
  acceptableWords,
  bandWords,
  groupTitle,
  listWords,
  sizesInBand,
} from "../../../../src/features/peers/peer-words.ts";

const key = (thicknessMm: number, material: "mild-steel" | "stainless-steel" | "copper" = "mild-steel") =>
  peerGroupOf({ material, thicknessMm, nozzleMm: 0.8, gas: "air" });

test("a group is named by metal, band and nozzle", () => {
  expect(groupTitle(key(3))).toBe("Mild steel, 3.15 band, 0.8 mm nozzle");
});

// ISO 3, R10: the 3.15 band runs from 10^0.45 = 2.818 mm to 10^0.55 = 3.548 mm, 0.111 to 0.140 in. By the manufacturers'
// standard gauge 11 ga is 0.1196 in = 3.04 mm and 10 ga 0.1345 in = 3.42 mm.
test.each([
  ["metric", "2.82 to 3.55 mm, so 3 mm, 1/8 in, 11 ga and 10 ga together"],
  ["inch", "0.111 to 0.140 in, so 3 mm, 1/8 in, 11 ga and 10 ga together"],
] as const)("the 3.15 band in %s", (units, words) => {
  expect(bandWords(key(3), units)).toBe(words);
});

test("6 mm and 1/4 in meet; heavier sheet has no gauge", () => {
  expect(sizesInBand(8, "mild-steel")).toEqual(["6 mm", "1/4 in"]);
  expect(sizesInBand(14, "mild-steel")).toEqual(["25 mm", "1 in"]);
  expect(bandWords(key(1.25), "metric")).toContain("18 ga"); // 0.0478 in = 1.21 mm
});

test.each([
  [0.75, /^About 75 % of the test cuts/],
  [0.05, /^5 % or fewer/],
  [0.95, /^95 % or more/],
  [null, /^Too few shops/],
])("a share of %j of acceptable test cuts", (share, words) => {
  expect(acceptableWords(share)).toMatch(words);
});

test.each([
  [[], ""],
  [["a"], "a"],
  [["a", "b"], "a and b"],
  [["a", "b", "c"], "a, b and c"],
])("lists %j", (words, text) => {
  expect(listWords(words)).toBe(text);
});
