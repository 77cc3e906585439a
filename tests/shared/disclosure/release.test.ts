import { describe, expect, test } from "vitest";
import { PeerGroupFigures, type ReleasedGroup } from "#shared/contracts/released-figures.ts";
import type { GroupMemory } from "#shared/disclosure/ledger.ts";
import { DisclosureParameters, defaultDisclosureParameters as rules } from "#shared/disclosure/parameters.ts";
import { releaseGroup } from "#shared/disclosure/release.ts";
import { rememberRelease } from "#shared/disclosure/remember-release.ts";
import { threeShopStep } from "#shared/disclosure/three-shop-step.ts";
import type { Contribution } from "#shared/peers/contribution.ts";
import type { Metric } from "#shared/recipes/metrics.ts";
import {
  edition1,
  edition2,
  edition3,
  edition4,
  edition5,
  makeContribution,
  someKey,
} from "#tests/support/peer-factories.ts";

/** Builds one edition of a group and what the next one must know. */
function build(contributions: Contribution[], memory: GroupMemory | null, edition = edition1, parameters = rules) {
  const figures = releaseGroup(contributions, memory, parameters, edition);
  return { figures, memory: rememberRelease(contributions, memory, parameters, figures) };
}

const shops = (count: number) =>
  Array.from({ length: count }, (_, i) => makeContribution(i + 1, { currentA: 41 + i, feedMmMin: 1000 + 100 * i }));

const change = (contributions: Contribution[], changed: number[], metric: Metric, value: number | null) =>
  contributions.map((c) => (changed.includes(c.shop) ? { ...c, setpoints: { ...c.setpoints, [metric]: value } } : c));

const without = (contributions: Contribution[], gone: number[]) => contributions.filter((c) => !gone.includes(c.shop));

const released = (figures: PeerGroupFigures): ReleasedGroup => {
  if (figures.status !== "released") throw new Error(`withheld: ${figures.reason}`);
  return figures;
};

describe("three-shop step", () => {
  const question = { shownBefore: true, changedShops: 1, withdrawnShops: 0, heldEditions: 0 };

  test.each([
    [{ shownBefore: false }, "release new"],
    [{ changedShops: 0 }, "keep old figures"],
    [{ changedShops: 2 }, "keep old figures"],
    [{ changedShops: 3 }, "release new"],
    [{ withdrawnShops: 1 }, "keep old figures"],
    [{ withdrawnShops: 1, heldEditions: 1 }, "keep old figures"],
    [{ withdrawnShops: 1, heldEditions: 2 }, "withhold"],
    [{ withdrawnShops: 1, heldEditions: 2, changedShops: 3 }, "release new"],
    [{ heldEditions: 9 }, "keep old figures"],
  ] as const)("%j: %s", (given, decision) => {
    expect(threeShopStep({ ...question, ...given }, rules)).toBe(decision);
  });

  test("a network that holds nothing withholds at once", () => {
    const strict = DisclosureParameters.parse({ heldEditions: 0 });
    expect(threeShopStep({ ...question, withdrawnShops: 1 }, strict)).toBe("withhold");
  });
});

describe("release of a group", () => {
  test("under the quorum it says so and nothing else", () => {
    const { figures, memory } = build(shops(4), null);
    expect(figures).toEqual({ status: "withheld", key: someKey, reason: "quorum" });
    expect(memory).toBeNull();
  });

  test("from the quorum on it is what the contract promises, with nothing of any one shop", () => {
    const { figures } = build(shops(12), null);
    expect(PeerGroupFigures.parse(figures)).toEqual(figures);
    expect(released(figures)).toMatchObject({ shops: "10-19", recipes: "10-19", figuresFrom: edition1 });
    expect(JSON.stringify(figures)).not.toMatch(/"shop"|"machine"/);
  });

  test("nothing changed: the old figures stay, with their date", () => {
    const first = build(shops(6), null);
    expect(build(shops(6), first.memory, edition2).figures).toEqual(first.figures);
  });

  test("two shops joined: the old figures stay", () => {
    const first = build(shops(6), null);
    expect(build(shops(8), first.memory, edition2).figures).toEqual(first.figures);
  });

  test("three shops joined: the figures move", () => {
    const first = build(shops(6), null);
    const second = released(build(shops(9), first.memory, edition2).figures);
    expect(second.figuresFrom).toEqual(edition2);
    expect(second.distributions.currentA).not.toEqual(released(first.figures).distributions.currentA);
  });

  test("changes add up over editions until three shops have changed", () => {
    const first = build(shops(6), null);
    const second = build(shops(7), first.memory, edition2);
    const third = build(shops(8), second.memory, edition3);
    const fourth = build(shops(9), third.memory, edition4);
    expect(third.figures).toEqual(first.figures);
    expect(released(fourth.figures).figuresFrom).toEqual(edition4);
  });

  test("a withdrawal that would show is held for two editions, then the group is withheld until three shops changed", () => {
    const first = build(shops(7), null);
    const second = build(without(shops(7), [1]), first.memory, edition2);
    const third = build(without(shops(7), [1]), second.memory, edition3);
    const fourth = build(without(shops(7), [1]), third.memory, edition4);
    const fifth = build(without(shops(9), [1]), fourth.memory, edition5);
    expect([second.figures, third.figures]).toEqual([first.figures, first.figures]);
    expect(fourth.figures).toEqual({ status: "withheld", key: someKey, reason: "three-shop-step" });
    expect(released(fifth.figures).figuresFrom).toEqual(edition5);
  });

  test("a shop that comes back with what it had brings the old figures back", () => {
    const first = build(shops(7), null);
    let last = first;
    for (const edition of [edition2, edition3, edition4]) last = build(without(shops(7), [1]), last.memory, edition);
    expect(last.figures.status).toBe("withheld");
    expect(build(shops(7), last.memory, edition5).figures).toEqual(first.figures);
  });

  test("a group that falls under the quorum is withheld at once", () => {
    const first = build(shops(5), null);
    const second = build(without(shops(5), [1]), first.memory, edition2);
    expect(second.figures).toEqual({ status: "withheld", key: someKey, reason: "quorum" });
    expect(build([], second.memory, edition3).figures).toEqual({ status: "withheld", key: someKey, reason: "quorum" });
  });

  test("back over the quorum with one shop in another's place, it is not shown anew", () => {
    const first = build(shops(5), null);
    const second = build(without(shops(5), [1]), first.memory, edition2);
    const third = build(without(shops(6), [1]), second.memory, edition3);
    expect(third.figures).toEqual(first.figures); // one gone, one new: two shops changed
  });
});

describe("release of a metric within its group", () => {
  test("three shops changed the group but one alone its current: the current stays as it was", () => {
    const start = shops(8);
    const first = build(start, null);
    const changed = change(change(start, [1], "currentA", 90), [1, 2, 3], "feedMmMin", 3000);
    const second = released(build(changed, first.memory, edition2).figures);
    expect(second.distributions.currentA).toEqual(released(first.figures).distributions.currentA);
    expect(second.distributions.feedMmMin?.figuresFrom).toEqual(edition2);
  });

  test("changes of one metric add up while the group moves on", () => {
    const start = shops(8);
    const first = build(start, null);
    const one = change(change(start, [1], "currentA", 90), [1, 2, 3], "feedMmMin", 3000);
    const second = build(one, first.memory, edition2);
    const third = build(change(one, [4, 5], "currentA", 90), second.memory, edition3);
    expect(released(third.figures).distributions.currentA?.figuresFrom).toEqual(edition3);
  });

  test("a value taken out of one metric is held for two editions, then that metric alone is withheld", () => {
    const start = shops(8);
    let last = build(start, null);
    const figures = [edition2, edition3, edition4].map((edition) => {
      last = build(change(start, [1], "currentA", null), last.memory, edition);
      return released(last.figures);
    });
    expect(figures.map((f) => f.distributions.currentA !== null)).toEqual([true, true, false]);
    expect(figures.every((f) => f.distributions.feedMmMin !== null)).toBe(true);
  });

  test("a value put back where it was brings the metric's old figures back", () => {
    const start = shops(8);
    const first = build(start, null);
    let last = first;
    for (const edition of [edition2, edition3, edition4]) {
      last = build(change(start, [1], "currentA", null), last.memory, edition);
    }
    expect(released(last.figures).distributions.currentA).toBeNull();
    expect(build(start, last.memory, edition5).figures).toEqual(first.figures);
  });

  test("a metric that reaches its quorum later is shown from then on", () => {
    const start = shops(8);
    const first = build(start, null);
    const filled = change(start, [1, 2, 3, 4, 5], "arcVoltageV", 120);
    expect(released(first.figures).distributions.arcVoltageV).toBeNull();
    expect(released(build(filled, first.memory, edition2).figures).distributions.arcVoltageV?.quantiles.p50).toBe(120);
  });
});

describe("memory between editions", () => {
  test("is plain data: it survives being stored as JSON", () => {
    const first = build(shops(6), null);
    const stored = JSON.parse(JSON.stringify(first.memory)) as GroupMemory;
    expect(build(shops(8), stored, edition2)).toEqual(build(shops(8), first.memory, edition2));
  });

  test("holds what the digest makes of a value, never the value", () => {
    const digest = (text: string) => String(text.length);
    const memory = rememberRelease(
      shops(6),
      null,
      rules,
      releaseGroup(shops(6), null, rules, edition1, digest),
      digest,
    );
    expect(Object.values(memory!.ledger.currentA[1]!)).toEqual([digest("1/100/currentA/41")]);
  });

  test("mixed groups are refused", () => {
    const other = { ...makeContribution(9, { currentA: 45 }), key: { ...someKey, nozzleMm: 1 } };
    expect(() => releaseGroup([...shops(6), other], null, rules, edition1)).toThrow(RangeError);
    expect(() => releaseGroup([], null, rules, edition1)).toThrow(RangeError);
  });
});
