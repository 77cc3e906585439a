import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { sampleAnswers, sampleContent, sampleId, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { Refusal, renderPage, testOwner } from "#tests/support/render-page.tsx";
import { EditRecipePage } from "../../../../src/features/recipes/edit-recipe-page.tsx";
import { NewRecipePage } from "../../../../src/features/recipes/new-recipe-page.tsx";

// Whole forms with their strips take their time where no browser draws them.
vi.setConfig({ testTimeout: 20_000 });

const recipe = sampleRecipe();
const routes = [
  { path: "/recipes/new", Component: NewRecipePage },
  { path: "/recipes/:id/edit", Component: EditRecipePage },
  { path: "/recipes/:id", element: <h1>The recipe's page</h1> },
];
const answers = { ...sampleAnswers, [`GET /api/recipes/${recipe.id}`]: recipe };

function edit(more: Record<string, unknown> = {}, units: "metric" | "inch" = "metric") {
  return renderPage({
    routes,
    at: `/recipes/${recipe.id}/edit`,
    answers: { ...answers, ...more },
    session: { ...testOwner, units },
  });
}

const box = (name: string | RegExp) => screen.findByRole<HTMLInputElement>("textbox", { name });
const press = async (name: string) => userEvent.click(await screen.findByRole("button", { name }));
async function type(name: string, text: string) {
  const field = await box(name);
  await userEvent.clear(field);
  await userEvent.paste(text);
}

afterEach(() => sessionStorage.clear());

test("keeps a new recipe with what was typed in any unit, the gauge read by its metal", async () => {
  const { sent } = renderPage({
    routes,
    at: "/recipes/new",
    answers: { ...answers, "POST /api/recipes": recipe },
  });
  await type("Thickness", "11 ga");
  expect(screen.getByText("= 3.04 mm")).toBeTruthy();
  await type("Nozzle orifice", "0.8");
  await type("Gas pressure", "65 psi");
  await type("Feed rate", "95 ipm");
  await press("Keep recipe");
  expect(await screen.findByText("The recipe's page")).toBeTruthy();
  const { content } = sent.find(({ method }) => method === "POST")!.body as {
    content: ReturnType<typeof sampleContent>;
  };
  // 11 gauge of mild steel: 5 lb/ft² over 41.82 lb/ft² an inch (15 U.S.C. 206, ASTM B258) = 0.11956 in = 3.037 mm
  expect(content.thicknessMm).toBe(3.037);
  expect(content.setpoints.pressureBar).toBeCloseTo(4.4816, 4); // 65 psi × 0.0689476 bar
  expect(content.setpoints.feedMmMin).toBe(2413); // 95 × 25.4
  expect(content.setpoints.kerfWidthMm).toBeNull();
});

test("says at each wrong field what is allowed, in the member's unit, and sends nothing", async () => {
  const { sent } = edit({}, "inch");
  await type("Gas pressure", "400");
  await type("Pierce height", "0.03 in");
  await press("Save as new version");
  // 2 to 9 bar are 29.01 to 130.5 psi
  expect(await screen.findByText(/^Allowed: 29\.1 to 130\.5 psi/)).toBeTruthy();
  expect(sent.some(({ method }) => method === "PUT")).toBe(false);
  await type("Gas pressure", "65");
  await press("Save as new version");
  expect(await screen.findByText("Pierce height cannot be below cut height")).toBeTruthy();
});

test("asks about figures seldom right and about what the machine cannot give, and keeps them when told to", async () => {
  const { sent } = edit({ [`PUT /api/recipes/${recipe.id}`]: recipe });
  await type("Current", "120");
  await type("Gas pressure", "7.5");
  await press("Save as new version");
  const dialog = await screen.findByRole("dialog", { name: "Are these figures right?" });
  expect(within(dialog).getByText(/Gas pressure of 7\.50 bar is seldom right/)).toBeTruthy();
  expect(within(dialog).getByText(/120 A is more than Long table can do: at most 65 A/)).toBeTruthy();
  await press("Go back and change");
  expect(sent.some(({ method }) => method === "PUT")).toBe(false);
  await press("Save as new version");
  await press("Keep it anyway");
  await screen.findByText("The recipe's page");
  expect(sent.filter(({ method }) => method === "PUT")).toHaveLength(1);
});

test("shows heat and standing while they are typed", async () => {
  edit();
  expect(await screen.findByText("Heat check: plausible")).toBeTruthy();
  expect(await screen.findByText("103.0 V: typical")).toBeTruthy();
  await type("Arc voltage", "112");
  expect(await screen.findByText("112.0 V: unusually high")).toBeTruthy();
  await type("Feed rate", "14000");
  expect(await screen.findByText("Heat check: this cannot be")).toBeTruthy();
});

const theirs = {
  ...recipe,
  version: sampleVersion(4, {
    changedBy: "Ula Marr",
    reason: "Worn nozzle",
    content: sampleContent({}, { feedMmMin: 2300 }),
  }),
};

function editStale() {
  const page = edit({
    [`PUT /api/recipes/${recipe.id}`]: ({ body }: { body: unknown }) =>
      (body as { baseVersion: number }).baseVersion === 4 ? recipe : new Refusal("stale-version", { current: theirs }),
  });
  const bases = () =>
    page.sent.filter(({ method }) => method === "PUT").map(({ body }) => (body as { baseVersion: number }).baseVersion);
  return { ...page, bases };
}

async function saveStale() {
  await type("Feed rate", "2600");
  await press("Save as new version");
  return screen.findByRole("dialog", { name: "Somebody changed this recipe meanwhile" });
}

test("a change made meanwhile is shown beside one's own; saving mine goes on top of it", async () => {
  const { bases } = editStale();
  const dialog = await saveStale();
  const row = within(dialog).getByRole("row", { name: /Feed rate/ });
  expect(
    within(row)
      .getAllByRole("cell")
      .map((cell) => cell.textContent),
  ).toEqual(["2,300 mm/min", "2,600 mm/min"]);
  expect(dialog.textContent).toContain("Ula Marr saved version 4: “Worn nozzle”");
  await press("Save mine as version 5");
  await screen.findByText("The recipe's page");
  expect(bases()).toEqual([3, 4]);
});

test("taking theirs saves nothing and forgets the draft", async () => {
  const { bases } = editStale();
  await saveStale();
  await press("Take theirs, drop mine");
  await screen.findByText("The recipe's page");
  expect(bases()).toEqual([3]);
  expect(Object.keys(sessionStorage)).toEqual([]);
});

test("going back to the form keeps what was typed and says that it is not saved", async () => {
  editStale();
  await saveStale();
  await press("Back to the form");
  expect(await screen.findByText("Not saved: version 4 is newer than the one you began with")).toBeTruthy();
  expect((await box("Feed rate")).value).toBe("2600");
});

test("a draft found again still counts from the version it began with", async () => {
  const draft = { reason: "Typed before the session ended", baseVersion: 2 };
  sessionStorage.setItem(`draft:recipe:${recipe.id}`, JSON.stringify(draft));
  const { bases } = editStale();
  expect((await box(/Reason for the change/)).value).toBe(draft.reason);
  await press("Save as new version");
  await waitFor(() => expect(bases()).toEqual([2]));
});

test("a copy starts with the numbers of the one copied", async () => {
  renderPage({ routes, at: `/recipes/new?copy=${recipe.id}`, answers });
  expect((await box("Feed rate")).value).toBe("2450");
  expect(screen.getByText("A copy of Mild steel, 3 mm, 0.8 mm nozzle")).toBeTruthy();
});

test("without a machine it sends its owner to describe one", async () => {
  renderPage({ routes, at: "/recipes/new", answers: { "GET /api/machines": { items: [] } } });
  expect((await screen.findByRole("link", { name: "Add a machine" })).getAttribute("href")).toBe("/machines/new");
});

test("a retired recipe is not changed", async () => {
  const retired = { ...recipe, id: sampleId(1), state: "retired" };
  edit({ [`GET /api/recipes/${recipe.id}`]: retired });
  expect(await screen.findByText("This recipe is retired")).toBeTruthy();
  expect(screen.queryByRole("button", { name: "Save as new version" })).toBeNull();
});
