import { expect, test } from "vitest";
import { inventNetwork, type KnownShop } from "#server/seed/demo-network.ts";

const known: KnownShop[] = [
  {
    name: "Known Yard",
    place: "Testham",
    people: [{ name: "Ada Example", email: "ada@known.example", role: "owner" }],
    kind: "established",
    habit: "metric",
    avoid: ["aluminium"],
  },
  {
    name: "New Yard",
    place: "Testham",
    people: [{ name: "Bo Example", email: "bo@new.example", role: "owner" }],
    kind: "just-joined",
    habit: "inch",
  },
];
const network = inventNetwork(known, 68);
const shops = [...network.before, ...network.between];
const books = [...shops.flatMap((shop) => shop.books), ...network.added];

test("is the same each time and as large as promised", () => {
  expect(inventNetwork(known, 68)).toEqual(network);
  expect(shops).toHaveLength(68);
  expect(shops.flatMap((shop) => shop.machines).length).toBeGreaterThanOrEqual(85);
  expect(books.length).toBeGreaterThanOrEqual(1450);
});

test("a shop that has just joined has no machine and no recipe; one that avoids a metal has none of it", () => {
  const find = (name: string) => shops.find(({ shop }) => shop.name === name)!;
  expect(find("New Yard")).toMatchObject({ machines: [], books: [] });
  const own = books.filter(({ recipe }) => recipe.shopId === find("Known Yard").shop.id);
  expect(own.length).toBeGreaterThan(10);
  expect(own.some(({ versions }) => versions.some(({ material }) => material === "aluminium"))).toBe(false);
});

test("only proven recipes are shared, and each is proven by its last cut", () => {
  for (const { recipe, versions, cuts, share } of books) {
    const newest = versions.at(-1)!;
    expect(recipe.currentVersion).toBe(newest.number);
    if (share) expect(newest.provenAt).not.toBeNull();
    if (newest.provenAt) {
      expect(newest.provenAt).toEqual(cuts.at(-1)?.cutAt);
      expect(cuts.at(-1)?.acceptable).toBe(true);
    }
  }
});

test("has honest mess: gaps, other people's units, values that are off", () => {
  const newest = books.map(({ versions }) => versions.at(-1)!);
  expect(newest.some(({ kerfWidthMm }) => kerfWidthMm === null)).toBe(true);
  expect(new Set(shops.map(({ people }) => people[0]!.user.units)).size).toBe(2);
});

test("names no domain that could be somebody's", () => {
  const emails = shops.flatMap(({ people }) => people.map(({ user }) => user.email));
  expect(emails.every((email) => email.endsWith(".example"))).toBe(true);
  expect(new Set(emails).size).toBe(emails.length);
});
