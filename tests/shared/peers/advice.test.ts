import { describe, expect, test } from "vitest";
import { checkFirst } from "#shared/peers/advice.ts";
import { rankBook } from "#shared/peers/book-ranking.ts";
import { usuallyGoesWith } from "#shared/peers/usual-signs.ts";
import { metrics } from "#shared/recipes/metrics.ts";
import { makeDistribution, makeGroup, makeSetpoints, someKey } from "#tests/support/peer-factories.ts";

const group = makeGroup({
  currentA: makeDistribution(43, 45, 47),
  arcVoltageV: makeDistribution(118, 120, 122),
  cutHeightMm: makeDistribution(1.5, 1.6, 1.7),
  kerfWidthMm: makeDistribution(1.4, 1.5, 1.6, { spread: Math.log(1.6 / 1.4) / 1.349 }),
});

describe("what to check first", () => {
  test("the furthest out comes first, typical ones not at all", () => {
    const checks = checkFirst(makeSetpoints({ currentA: 45, arcVoltageV: 127, cutHeightMm: 3 }), group, false);
    expect(checks.map((c) => c.metric)).toEqual(["cutHeightMm", "arcVoltageV"]);
  });

  test("an unusual voltage names the cut height that is out on the same side", () => {
    const [check] = checkFirst(makeSetpoints({ arcVoltageV: 135, cutHeightMm: 1.9 }), group, false);
    expect(check?.metric).toBe("arcVoltageV");
    expect(check?.matching.map((m) => m.metric)).toEqual(["cutHeightMm"]);
    expect(check?.verdict).toContain("cut height (high)");
  });

  test("a cut height out on the other side explains nothing", () => {
    const [check] = checkFirst(makeSetpoints({ arcVoltageV: 135, cutHeightMm: 1.3 }), group, false);
    expect(check?.matching).toEqual([]);
    expect(check?.verdict).toContain("no other setpoint explains it");
  });

  test("with an acceptable test cut it is different, never wrong", () => {
    const checks = checkFirst(makeSetpoints({ arcVoltageV: 135, cutHeightMm: 4, currentA: 80 }), group, true);
    expect(checks).toHaveLength(3);
    expect(new Set(checks.map((c) => c.verdict))).toEqual(new Set(["Different, and it works for you."]));
  });

  test("a partnership holds from both sides wherever one cause moves both heights and voltage", () => {
    expect(usuallyGoesWith.arcVoltageV.high.partners.cutHeightMm).toBe("high");
    expect(usuallyGoesWith.cutHeightMm.high.partners.arcVoltageV).toBe("high");
  });

  test.each(metrics)("%s has signs on both sides", (metric) => {
    expect(usuallyGoesWith[metric].high.signs).not.toBe(usuallyGoesWith[metric].low.signs);
  });
});

describe("ranking the book", () => {
  const entry = (id: string, currentA: number | null, arcVoltageV: number | null = null) => ({
    id,
    setpoints: makeSetpoints({ currentA, arcVoltageV }),
    figures: group,
    hasAcceptableTestCut: false,
  });

  test("most unusual setpoints first, then the furthest out", () => {
    const { ranked } = rankBook([entry("typical", 45), entry("far", 90), entry("two", 52, 127), entry("near", 60)]);
    expect(ranked.map((r) => r.id)).toEqual(["two", "far", "near", "typical"]);
  });

  test("a recipe whose group is withheld, unknown or without its metrics is set apart", () => {
    const withheld = {
      ...entry("withheld", 45),
      figures: { status: "withheld", key: someKey, reason: "quorum" } as const,
    };
    const { ranked, withoutPeers } = rankBook([
      withheld,
      { ...entry("unknown", 45), figures: null },
      entry("empty", null),
    ]);
    expect(ranked).toEqual([]);
    expect(withoutPeers).toEqual(["withheld", "unknown", "empty"]);
  });
});
