import { expect, test } from "vitest";
import { standingOf } from "#shared/peers/standing.ts";
import { standingSentence } from "#shared/peers/standing-sentence.ts";
import { exampleFigures } from "../../../../src/features/home/example-figures.ts";

test("the landing page's example says what the statistics would say of those figures", () => {
  const { quantiles, spread, ownMmMin, sentence } = exampleFigures;
  const distribution = {
    shops: "10-19" as const,
    quantiles,
    spread,
    density: null,
    figuresFrom: { number: 1, date: "2026-11-01" },
  };
  expect(Math.log(quantiles.p75 / quantiles.p25) / 1.349).toBeCloseTo(spread, 4);
  const standing = standingOf("feedMmMin", ownMmMin, distribution);
  expect(standingSentence("feedMmMin", ownMmMin, standing, "metric")).toBe(sentence);
});
