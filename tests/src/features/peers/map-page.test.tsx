import { screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { sampleAnswers, sampleContent, sampleId, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { renderPage, type SentRequest, testOwner } from "#tests/support/render-page.tsx";
import { BookAgainstPeersPage } from "../../../../src/features/peers/book-page.tsx";
import { PeerMapPage } from "../../../../src/features/peers/map-page.tsx";

vi.setConfig({ testTimeout: 20_000 });

const edition = { id: sampleId(900), number: 4, date: "2026-11-01" };
const recipe = sampleRecipe();
const ranked = {
  recipe,
  groupId: "mild-steel_t3.15_n0.8_air",
  standings: [{ metric: "feedMmMin", value: 2450, percentile: 70, robustZ: 2.4, word: "unusually high" }],
  checkFirst: "Feed rate is unusually high: that usually goes with lag. Different, and it works for you.",
};
const routes = [
  { path: "/peers", Component: PeerMapPage },
  { path: "/peers/book", Component: BookAgainstPeersPage },
  { path: "*", element: "Another page" },
];
const nothingShown = { edition, groups: [], network: { exponents: [] } };
const answers = {
  ...sampleAnswers,
  "GET /api/recipes": ({ query }: SentRequest) => ({
    items: query.get("cursor") ? [sampleRecipe({ id: sampleId(2), version: oxygenVersion })] : [recipe],
    next: query.get("cursor") ? null : "second",
    total: 2,
  }),
  "GET /api/peers/book": { edition, ranked: [ranked], withoutPeers: 2 },
  [`GET /api/editions/${edition.id}/materials/mild-steel/oxygen`]: nothingShown,
  [`GET /api/editions/${edition.id}/materials/copper/oxygen`]: nothingShown,
};
const oxygenVersion = sampleVersion(1, { content: sampleContent({ processGas: "oxygen", thicknessMm: 6 }) });
const show = (at = "/peers", more = {}, session = testOwner) =>
  renderPage({ routes, at, answers: { ...answers, ...more }, session });

test("every square is a link that says what it shows, and whether an own recipe lies there", async () => {
  const { sent } = show();
  const grid = await screen.findByRole("grid", { name: /Mild steel cut with compressed air/ });
  const square = await within(grid).findByRole("link", {
    name: "Mild steel, 3.15 band, 0.8 mm nozzle: 5 to 9 shops: 1 recipe of yours",
  });
  expect(square.getAttribute("href")).toBe("/peers/mild-steel_t3.15_n0.8_air");
  expect(within(grid).getByRole("link", { name: /6.3 band, 0.8 mm nozzle: Not enough shops yet$/ })).toBeTruthy();
  expect(within(grid).getAllByRole("link")).toHaveLength(33);
  expect(sent.filter(({ path }) => path === "/api/recipes")).toHaveLength(2);
});

test("the map is one stop for Tab; arrows move in it", async () => {
  show();
  const grid = await screen.findByRole("grid");
  const links = () => within(grid).getAllByRole("link");
  expect(links().filter((link) => link.getAttribute("tabindex") === "0")).toEqual([links()[0]]);
  links()[0]!.focus();
  await userEvent.keyboard("{ArrowDown}{ArrowRight}");
  expect(document.activeElement).toBe(links()[4]);
  expect(links().filter((link) => link.getAttribute("tabindex") === "0")).toEqual([links()[4]]);
});

test("the same as a table, with the sizes that meet", async () => {
  show();
  await userEvent.click(await screen.findByText("The map as a table"));
  const table = screen.getByRole("table", { name: "Peer groups of mild steel" });
  const row = within(table).getByRole("row", { name: /3.15 band, 0.8 mm nozzle/ });
  expect(row.textContent).toContain("3 mm, 1/8 in, 11 ga, 10 ga");
  expect(row.textContent).toContain("5 to 9 shops");
});

test("metal and gas are kept in the URL, and a metal without figures says so", async () => {
  const { router } = show("/peers?gas=oxygen");
  await userEvent.selectOptions(await screen.findByRole("combobox", { name: "Metal" }), "copper");
  expect(await screen.findByText("No group of copper is shown yet")).toBeTruthy();
  expect(router.state.location.search).toBe("?gas=oxygen&metal=copper");
});

test("before the first edition it says why there is nothing", async () => {
  show("/peers", { "GET /api/editions/current": { edition: null } });
  expect(await screen.findByRole("heading", { name: "No edition is published yet" })).toBeTruthy();
  expect(screen.queryByRole("grid")).toBeNull();
});

test("the book is ranked with what to check first", async () => {
  show("/peers/book");
  const row = await screen.findByRole("row", { name: /Mild steel, 3 mm, 0.8 mm nozzle/ });
  expect(row.textContent).toContain("Feed rate 2,450 mm/min");
  expect(row.textContent).toContain("Different, and it works for you.");
  const peers = within(row).getByRole("link", { name: "Peers of Mild steel, 3 mm, 0.8 mm nozzle" });
  expect(peers.getAttribute("href")).toBe(`/peers/${ranked.groupId}?recipe=${recipe.id}`);
  expect(screen.getByText(/2 recipes are not here: their groups have too few shops/)).toBeTruthy();
});

test("an admin without a shop sees the map and no book", async () => {
  const { sent } = show("/peers", {}, { ...testOwner, shop: null, admin: true });
  expect(await screen.findByRole("grid")).toBeTruthy();
  expect(sent.some(({ path }) => path === "/api/recipes" || path === "/api/peers/book")).toBe(false);
});
