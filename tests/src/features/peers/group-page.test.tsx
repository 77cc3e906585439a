import { screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import type { ListedRecipe, PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { edition3, makeDistribution, makeGroup, makeSetpoints, someKey } from "#tests/support/peer-factories.ts";
import { sampleContent, sampleId, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { renderPage, testOwner } from "#tests/support/render-page.tsx";
import { PeerGroupPage } from "../../../../src/features/peers/group-page.tsx";

vi.setConfig({ testTimeout: 20_000 });

const edition = { id: sampleId(900), number: 4, date: "2026-11-01" };
const groupId = "mild-steel_t3.15_n0.8_air";
const figuresFrom = { number: 4, date: "2026-11-01" };
const group = makeGroup(
  {
    currentA: makeDistribution(40, 42, 44, { figuresFrom, shops: "20-49" }),
    feedMmMin: makeDistribution(2080, 2310, 2490, { figuresFrom: edition3, spread: 0.13, shops: "10-19" }),
  },
  { shops: "20-49", recipes: "50+", figuresFrom, acceptableShare: 0.75 },
);
const odd = sampleRecipe({ version: sampleVersion(1, { content: sampleContent({}, { currentA: 60 }) }) });
const untried = sampleRecipe({
  id: sampleId(2),
  state: "draft",
  machineName: "Short table",
  version: sampleVersion(1, { content: sampleContent({ thicknessMm: 3.2 }, { currentA: 60 }), proven: false }),
});
const listed: ListedRecipe = {
  id: sampleId(70),
  material: "mild-steel",
  thicknessMm: 3,
  nozzleMm: 0.8,
  gas: "air",
  setpoints: makeSetpoints({ currentA: 41, feedMmMin: 2300 }),
  quarter: "2026-Q2",
  text: "Drain the trap first",
  traits: { startMethod: "contact", dryness: null, heightControl: null },
};

interface Shown {
  figures?: PeerGroupFigures;
  recipes?: unknown[];
  shownListings?: ListedRecipe[];
  at?: string;
  session?: typeof testOwner;
}
function show({ figures = group, recipes = [odd], shownListings = [listed], at, session = testOwner }: Shown = {}) {
  return renderPage({
    routes: [{ path: "/peers/:groupId", Component: PeerGroupPage }],
    at: at ?? `/peers/${groupId}`,
    session,
    answers: {
      "GET /api/editions/current": { edition },
      [`GET /api/editions/${edition.id}/groups/${groupId}`]: { edition, figures, listed: shownListings },
      "GET /api/recipes": { items: recipes, next: null, total: recipes.length },
    },
  });
}

test("the header says in words what is compared", async () => {
  show();
  expect(await screen.findByRole("heading", { level: 1, name: "Mild steel, 3.15 band, 0.8 mm nozzle" })).toBeTruthy();
  expect(
    screen.getByText(
      "2.82 to 3.55 mm, so 3 mm, 1/8 in, 11 ga and 10 ga together · compressed air · 20 to 49 shops · edition of 1 November 2026",
    ),
  ).toBeTruthy();
});

test("a strip for every metric, the own value on it, and what is missing said", async () => {
  show();
  expect(await screen.findByRole("img", { name: /Your 60 A is above p75/ })).toBeTruthy();
  expect(screen.getAllByRole("img", { name: "Not enough shops yet" })).toHaveLength(6);
  expect(screen.getByText("unusually high: above p75")).toBeTruthy();
  expect(screen.getByText("Filled in by 10 to 19 shops")).toBeTruthy();
});

test("held figures are named with their date", async () => {
  show();
  expect(await screen.findByText(/Held figures: feed rate from the edition of 1 July 2026\./)).toBeTruthy();
});

test("with an acceptable test cut nothing is called wrong", async () => {
  show();
  expect(await screen.findByText("Current is unusually high.")).toBeTruthy();
  expect(screen.getByText("It has an acceptable test cut: different, and it works for you.")).toBeTruthy();
  expect(screen.queryByText(/Check the current/)).toBeNull();
});

test("without one it says what to check first; several own recipes are chosen among", async () => {
  const { router } = show({ recipes: [odd, untried] });
  const choice = await screen.findByRole("combobox", { name: "Your recipe on the strips" });
  await userEvent.selectOptions(choice, untried.id);
  expect(router.state.location.search).toBe(`?recipe=${untried.id}`);
  expect(screen.getByText(/Check the current first: no other setpoint explains it\./)).toBeTruthy();
  const start = screen.getByRole("link", { name: "Make a starting recipe" });
  const asked = new URL(start.getAttribute("href")!, "http://page.example").searchParams;
  expect(Object.fromEntries(asked)).toMatchObject({ metal: "mild-steel", thickness: "3.2", nozzle: "0.8" });
});

test("recipes of another group of the metal are no marks here", async () => {
  show({ recipes: [sampleRecipe({ version: sampleVersion(1, { content: sampleContent({ thicknessMm: 6 }) }) })] });
  expect(await screen.findByText(/You have no recipe in this group/)).toBeTruthy();
  expect(screen.getByRole("img", { name: "Current: half of the peers lie below 42 A." })).toBeTruthy();
});

test("listed recipes stand without a name, by quarter, with traits and the owner's words", async () => {
  show();
  const row = await screen.findByRole("row", { name: /Drain the trap first/ });
  expect(row.textContent).toContain("April to June 2026 · starts: contact (no high frequency)");
  expect(row.textContent).toContain("2,300");
});

test("test cuts and shops in words, figures in inches for inch members", async () => {
  show({ session: { ...testOwner, units: "inch" } });
  expect(await screen.findByText(/About 75 % of the test cuts recorded here were acceptable/)).toBeTruthy();
  expect(screen.getByText(/0.111 to 0.140 in/)).toBeTruthy();
  expect(screen.getByText("90.6")).toBeTruthy(); // 2300 mm/min / 25.4
});

test.each([
  ["quorum", "Not enough shops yet"],
  ["three-shop-step", "Held back in this edition"],
] as const)("a group withheld by the %s rule says why and shows no figure", async (reason, title) => {
  show({ figures: { status: "withheld", key: someKey, reason }, shownListings: [] });
  expect(await screen.findByText(title)).toBeTruthy();
  expect(screen.queryAllByRole("img")).toEqual([]);
  expect(screen.queryByText(/to \d+ shops/)).toBeNull();
  expect(screen.getByRole("link", { name: "Make a starting recipe" })).toBeTruthy();
});

test("a name that no group can have is not found", async () => {
  show({ at: "/peers/unobtainium" });
  expect(await screen.findByRole("heading", { level: 1, name: /nothing here|not found/i })).toBeTruthy();
});
