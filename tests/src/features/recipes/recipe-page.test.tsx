import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { sampleAnswers, sampleContent, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { renderPage, testOwner } from "#tests/support/render-page.tsx";
import { ComparePage } from "../../../../src/features/recipes/compare-page.tsx";
import { RecipePage } from "../../../../src/features/recipes/recipe-page.tsx";

vi.setConfig({ testTimeout: 20_000 });

const origin = { kind: "starting-recipe" as const, editionNumber: 4, basis: { feedMmMin: "peers" } };
const newest = sampleVersion(2, {
  content: sampleContent({ note: "Slats turned" }, { arcVoltageV: 112 }),
  reason: "Edge stays square",
  origin,
});
const first = sampleVersion(1, { changedBy: "", origin });
const recipe = sampleRecipe({ sharing: "counted", version: newest });
const at = `/recipes/${recipe.id}`;
const routes = [
  {
    path: "/recipes/:id",
    element: <RecipePage testCuts={() => <p>Its test cuts</p>} sharing={() => <p>Its sharing</p>} />,
  },
  { path: "/recipes/:id/compare", Component: ComparePage },
];
const answers = {
  ...sampleAnswers,
  [`GET /api${at}`]: recipe,
  [`GET /api${at}/versions`]: { items: [newest, first] },
};
const show = (more: Record<string, unknown> = {}, session = testOwner) =>
  renderPage({ routes, at, answers: { ...answers, ...more }, session });
const checks = async () => (await screen.findByText(/is unusually high/)).closest("li")!.textContent;

test("says what to check first, and leaves alone what has an acceptable test cut", async () => {
  show();
  expect(await checks()).toBe(
    "Arc voltage of 112.0 V is unusually high. It usually goes with a torch that rides high: top bevel and a wide kerf." +
      "Different, and it works for you.",
  );
});

test("an unproven version gets the advice", async () => {
  show({ [`GET /api${at}`]: { ...recipe, state: "draft", version: { ...newest, proven: false } } });
  expect(await checks()).toContain("Check the arc voltage first: no other setpoint explains it.");
});

test("the history names who, why and what, and where the first numbers came from", async () => {
  show();
  const entries = within(await screen.findByRole("region", { name: "History" })).getAllByRole("listitem");
  expect(entries[0]!.textContent).toContain("Ode Venn“Edge stays square”Arc voltage 103.0 → 112.0 V");
  expect(screen.getByText("Somebody who has left")).toBeTruthy();
  expect(screen.getAllByText("Began as a starting recipe of edition 4.")).toHaveLength(2);
  expect(screen.getByText("Its test cuts")).toBeTruthy();
});

test("the setup sheet carries numbers, state, version, cautions and the way back", async () => {
  show();
  await screen.findByRole("region", { name: "History" });
  const sheet = document.querySelector("[data-setup-sheet]")!;
  expect(sheet.textContent).toContain("Version 2, saved 3 November 2026 by Ode Venn");
  expect(sheet.textContent).toContain("Proven by an acceptable test cut.");
  expect(sheet.textContent).toContain("Arc voltage112.0 V");
  expect(sheet.textContent).toContain("at least shade 8 for up to 45 A");
  expect(sheet.textContent).toContain(`${window.location.origin}${at}`);
  await waitFor(() => expect(sheet.querySelector('svg[role="img"] path')).toBeTruthy());
});

test("retiring asks first and says what it ends", async () => {
  const { sent } = show({ [`POST /api${at}/retirement`]: { ...recipe, state: "retired" } });
  await userEvent.click(await screen.findByRole("button", { name: "Retire" }));
  const dialog = await screen.findByRole("dialog", { name: "Retire Mild steel, 3 mm, 0.8 mm nozzle?" });
  expect(dialog.textContent).toContain("from the next edition on it is not counted");
  await userEvent.click(within(dialog).getByRole("button", { name: "Retire recipe" }));
  expect(await screen.findByText("Retired. It stays in the book to read.")).toBeTruthy();
  expect(sent.filter(({ method }) => method === "POST")).toHaveLength(1);
});

test("an operator is not offered to retire", async () => {
  show({}, { ...testOwner, shop: { ...testOwner.shop!, role: "operator" } });
  await screen.findByRole("link", { name: "Change" });
  expect(screen.queryByRole("button", { name: "Retire" })).toBeNull();
});

test("two versions stand side by side, what differs is marked", async () => {
  renderPage({ routes, at: `${at}/compare?from=1&to=2`, answers });
  const row = await screen.findByRole("row", { name: /Arc voltage \(differs\)/ });
  expect(
    within(row)
      .getAllByRole("cell")
      .map((cell) => cell.textContent),
  ).toEqual(["103.0 V", "112.0 V"]);
  expect(screen.getAllByRole("row", { name: /\(differs\)/ })).toHaveLength(2); // and the note
});
