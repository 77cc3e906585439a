import { describe, expect, test } from "vitest";
import { ListedRecipe } from "#shared/contracts/released-figures.ts";
import { type ListingSource, namelessCopy, quarterOf, shownListings } from "#shared/disclosure/listed-recipe.ts";
import { defaultDisclosureParameters as rules } from "#shared/disclosure/parameters.ts";
import { peerGroupId } from "#shared/peers/peer-group.ts";
import { makeGroup, makeSetpoints, someKey } from "#tests/support/peer-factories.ts";

const traits = { startMethod: "contact", dryness: "desiccant", heightControl: "arc-voltage" } as const;
const own = { shop: "Lantern Hollow Fabrication", people: ["Odile Brannock"] };
const source: ListingSource = {
  material: "mild-steel",
  thicknessMm: 3.038,
  nozzleMm: 0.81,
  gas: "air",
  setpoints: makeSetpoints({ currentA: 45.2, feedMmMin: 2456, pierceDelayS: 0.33 }),
  changedAt: "2026-08-14T09:31:07.000Z",
  text: " Runs clean on pickled sheet. ",
  traits,
};
const machines = (count: number) => Array.from({ length: count }, (_, i) => ({ shop: i, traits }));

describe("nameless copy", () => {
  test("is rounded, dated to the quarter and valid with a random id", () => {
    const copy = namelessCopy(source, machines(5), own, rules);
    expect(copy).toEqual({
      material: "mild-steel",
      thicknessMm: 3,
      nozzleMm: 0.8,
      gas: "air",
      setpoints: makeSetpoints({ currentA: 45, feedMmMin: 2460, pierceDelayS: 0.35 }),
      quarter: "2026-Q3",
      text: "Runs clean on pickled sheet.",
      traits,
    });
    expect(ListedRecipe.safeParse({ id: "6f8e0f6e-3c0e-4c8b-9a54-0b1f0c9d7e21", ...copy }).success).toBe(true);
  });

  test("shows a trait only where five shops share it", () => {
    const four = [...machines(4), { shop: 9, traits: { ...traits, dryness: "untreated" as const } }];
    expect(namelessCopy(source, four, own, rules).traits).toEqual({ ...traits, dryness: null });
  });

  test("five machines of one shop share nothing", () => {
    const oneShop = Array.from({ length: 5 }, () => ({ shop: 1, traits }));
    expect(namelessCopy(source, oneShop, own, rules).traits).toEqual({
      startMethod: null,
      dryness: null,
      heightControl: null,
    });
  });

  test("drops a text that fails the screening, and an empty one", () => {
    expect(namelessCopy({ ...source, text: "Ask at Lantern Hollow" }, [], own, rules).text).toBeNull();
    expect(namelessCopy({ ...source, text: "  " }, [], own, rules).text).toBeNull();
  });

  test.each([
    ["2026-01-01", "2026-Q1"],
    ["2026-03-31T23:59:59Z", "2026-Q1"],
    ["2026-04-01", "2026-Q2"],
    ["2026-12-31", "2026-Q4"],
  ])("%s lies in %s", (date, quarter) => {
    expect(quarterOf(date)).toBe(quarter);
  });

  test.each(["14 August", "2026-13-01", "2026-00-01"])("refuses the date %s", (date) => {
    expect(() => quarterOf(date)).toThrow(RangeError);
  });
});

describe("listings a group shows", () => {
  const groupId = peerGroupId(someKey);
  const listing = (shop: number, feedMmMin: number, id = `${shop}`) => ({
    shop,
    groupId,
    recipe: { ...namelessCopy({ ...source, setpoints: makeSetpoints({ feedMmMin }) }, [], own, rules), id },
  });

  test("none with two shops, however many recipes they list", () => {
    expect(shownListings(makeGroup({}), [listing(1, 900), listing(1, 1000), listing(2, 1100)], rules)).toEqual([]);
  });

  test("three shops: all of them, ordered by figures and not by arrival", () => {
    const shown = shownListings(makeGroup({}), [listing(3, 1200), listing(1, 900, "b"), listing(2, 900, "a")], rules);
    expect(shown.map((r) => r.id)).toEqual(["a", "b", "3"]);
  });

  test("none while the group is withheld", () => {
    const withheld = { status: "withheld", key: someKey, reason: "quorum" } as const;
    expect(shownListings(withheld, [listing(1, 900), listing(2, 1000), listing(3, 1100)], rules)).toEqual([]);
  });

  test("those of another group do not count", () => {
    const elsewhere = { ...listing(3, 1200), groupId: "mild-steel_t4_n0.8_air" };
    expect(shownListings(makeGroup({}), [listing(1, 900), listing(2, 1000), elsewhere], rules)).toEqual([]);
  });
});
