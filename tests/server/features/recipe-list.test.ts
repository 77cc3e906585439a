import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { createTestApi, type TestApi, type TestClient } from "../../support/api.ts";
import { type MadeMachine, makeBook, type StaffedShop } from "../../support/book.ts";
import { makeMachine, makeRecipe } from "../../support/factories.ts";

let api: TestApi;
let own: StaffedShop;
let machine: MadeMachine;
let boss: TestClient;

const nobody = "00000000-0000-4000-8000-000000000000";

beforeAll(async () => {
  api = await createTestApi();
});
afterAll(() => api.close());

beforeEach(async () => {
  ({ own, machine, boss } = await makeBook(api));
});

describe("the list", () => {
  const grades = async (query: string) => {
    const { body } = await boss.get(`/api/recipes?${query}`).expect(200);
    expect(body.total).toBe(body.items.length);
    return body.items.map((r: Recipe) => r.version.content.grade).sort();
  };

  async function fillBook() {
    const second = await makeMachine(api.owner, own.shop.id, { name: "Back_room 100%" });
    const make = (grade: string, values: Parameters<typeof makeRecipe>[3], at = machine.id) =>
      makeRecipe(api.owner, own.shop.id, at, { grade, ...values });
    await make("thin", { thicknessMm: 2.81 });
    await make("plain", { thicknessMm: 3, note: "Hand wheel" });
    await make("gauge", { thicknessMm: 3.18, proven: true, share: "counted" });
    await make("thick", { thicknessMm: 3.6, nozzleMm: 1.1 });
    await make("shiny", { material: "stainless-steel", thicknessMm: 6, nozzleMm: 1.04 }, second.id);
    return second;
  }

  test("filters by everything it offers", async () => {
    const second = await fillBook();
    expect(await grades("")).toEqual(["gauge", "plain", "shiny", "thick", "thin"]);
    expect(await grades("material=stainless-steel")).toEqual(["shiny"]);
    expect(await grades(`machineId=${second.id}`)).toEqual(["shiny"]);
    expect(await grades("state=proven")).toEqual(["gauge"]);
    expect(await grades("sharing=counted")).toEqual(["gauge"]);
    expect(await grades("sharing=private&state=draft")).toEqual(["plain", "shiny", "thick", "thin"]);
    expect(await grades("nozzleMm=1.0")).toEqual(["shiny"]);
  });

  // ISO 3, R10: the 3.15 band reaches from 10^0.45 = 2.818 mm to 10^0.55 = 3.548 mm.
  test("a thickness means its R10 band", async () => {
    await fillBook();
    expect(await grades("thicknessMm=3.4")).toEqual(["gauge", "plain"]);
  });

  test("finds words in grade, note, machine and material, all of them, as they are written", async () => {
    await fillBook();
    expect(await grades("search=WHEEL")).toEqual(["plain"]);
    expect(await grades("search=stainless")).toEqual(["shiny"]);
    expect(await grades("search=steel%20back")).toEqual(["shiny"]);
    expect(await grades("search=100%25")).toEqual(["shiny"]);
    expect(await grades("search=k_r")).toEqual(["shiny"]);
    expect(await grades("search=h_nd")).toEqual([]);
    expect(await grades("search=%25")).toEqual(["shiny"]);
    expect(await grades("search=%5C")).toEqual([]);
  });

  test.each(["changed", "material", "thickness", "nozzle", "machine", "current", "feed", "voltage", "pressure"])(
    "sorted by %s gives every recipe once over its pages, and backwards the other way round",
    async (sort) => {
      const second = await makeMachine(api.owner, own.shop.id, { name: "aa first" });
      for (let i = 0; i < 7; i++) {
        const measured = i % 3 === 0 ? null : 40 + (i % 2);
        await makeRecipe(api.owner, own.shop.id, i % 2 ? second.id : machine.id, {
          ...{ thicknessMm: 3 + (i % 3) / 7, nozzleMm: 0.8 + (i % 2) / 10, currentA: measured },
          ...{ material: i % 2 ? "copper" : "mild-steel", feedMmMin: measured && 1000 * measured ** 0.5 },
          ...{ arcVoltageV: measured && measured * 2.5, pressureBar: measured && measured / 9 },
        });
      }
      const walk = async (order: string) => {
        const items: Recipe[] = [];
        let cursor = "";
        for (let pages = 0; pages < 9; pages++) {
          const page = await boss.get(`/api/recipes?sort=${sort}&order=${order}&limit=2${cursor}`).expect(200);
          expect(page.body.total).toBe(7);
          items.push(...page.body.items);
          if (page.body.next === null) return items;
          cursor = `&cursor=${page.body.next}`;
        }
        throw new Error("the pages do not end");
      };
      const [up, down] = [await walk("asc"), await walk("desc")];
      expect(new Set(up.map(({ id }) => id)).size).toBe(7);
      const value = ({ version, machineName }: Recipe): string | number | null => {
        const { material, thicknessMm, nozzleMm, setpoints } = version.content;
        const values = { material, thickness: thicknessMm, nozzle: nozzleMm, machine: machineName.toLowerCase() };
        const { currentA: current, feedMmMin: feed, arcVoltageV: voltage, pressureBar: pressure } = setpoints;
        return { ...values, current, feed, voltage, pressure, changed: version.changedAt }[sort] ?? null;
      };
      const ascending = up.map(value).filter((v) => v !== null);
      const materialOrder = ["mild-steel", "copper"];
      const rank = (v: string | number) => (sort === "material" ? materialOrder.indexOf(String(v)) : v);
      expect(ascending.map(rank)).toEqual(ascending.map(rank).sort((a, b) => (a < b ? -1 : a > b ? 1 : 0)));
      expect(down.map(value).filter((v) => v !== null)).toEqual([...ascending].reverse());
      for (const list of [up, down]) {
        const missing = list.map(value).indexOf(null);
        if (missing >= 0) expect(new Set(list.slice(missing).map(value))).toEqual(new Set([null]));
      }
    },
  );

  test("a recipe added between two pages repeats and hides no other", async () => {
    for (let i = 0; i < 4; i++) await makeRecipe(api.owner, own.shop.id, machine.id);
    const first = (await boss.get("/api/recipes?limit=2").expect(200)).body;
    await makeRecipe(api.owner, own.shop.id, machine.id);
    const second = (await boss.get(`/api/recipes?limit=2&cursor=${first.next}`).expect(200)).body;
    const seen = [...first.items, ...second.items].map(({ id }: Recipe) => id);
    expect([new Set(seen).size, second.total, second.next]).toEqual([4, 5, null]);
  });

  const forge = (...parts: unknown[]) => Buffer.from(JSON.stringify(parts)).toString("base64url");
  test.each([
    ["letters", "abc"],
    ["another order's", forge("recipes feed asc", "3", nobody)],
    ["too short", forge("recipes changed desc", "2026-08-01T10:00:00Z")],
    ["a wrong date", forge("recipes changed desc", "2026-02-31T10:00:00Z", nobody)],
    ["a wrong id", forge("recipes changed desc", "2026-08-01T10:00:00Z", "x'; drop table recipes")],
    ["a number", forge("recipes changed desc", 7, nobody)],
  ])("refuses a cursor that is %s", async (_what, cursor) => {
    const { body } = await boss.get(`/api/recipes?cursor=${cursor}`).expect(400);
    expect(body.errors).toEqual([expect.objectContaining({ pointer: "?cursor" })]);
  });

  test("refuses a filter that does not exist", async () => {
    const { body } = await boss.get("/api/recipes?material=wood").expect(400);
    expect(body.errors[0].pointer).toBe("?material");
  });
});
