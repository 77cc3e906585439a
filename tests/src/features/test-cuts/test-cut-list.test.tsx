import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test } from "vitest";
import { sampleCut, sampleId, sampleRecipe } from "#tests/support/recipe-samples.ts";
import { renderPage } from "#tests/support/render-page.tsx";
import { RecipeTestCuts } from "../../../../src/features/test-cuts/recipe-test-cuts.tsx";
import { TestCutListPage } from "../../../../src/features/test-cuts/test-cut-list-page.tsx";

const cuts = [
  sampleCut({ uMm: 0.35, uRange: 3, bevelDeg: 1.5 }),
  sampleCut({ id: sampleId(102), cutThrough: false, acceptable: false, dross: "heavy", topEdge: "melted" }),
];
const recipe = sampleRecipe();
const routes = [
  { path: "/test-cuts", Component: TestCutListPage },
  { path: "/recipes/:id", element: <RecipeTestCuts recipe={recipe} /> },
];

test("filters go into the URL and to the server", async () => {
  const { sent, router } = renderPage({
    routes,
    at: "/test-cuts?material=mild-steel",
    answers: { "GET /api/test-cuts": { items: cuts, next: null, total: 2 } },
  });
  await screen.findByRole("table", { name: "The shop's test cuts" });
  await userEvent.selectOptions(screen.getByRole("combobox", { name: "Outcome" }), "Not acceptable");
  await waitFor(() => expect(sent.at(-1)?.query.toString()).toBe("material=mild-steel&acceptable=no"));
  expect(router.state.location.search).toBe("?material=mild-steel&acceptable=no");
});

test("each cut tells what was seen and measured", async () => {
  renderPage({ routes, at: "/test-cuts", answers: { "GET /api/test-cuts": { items: cuts, next: null, total: 2 } } });
  const rows = await screen.findAllByRole("row");
  expect(within(rows[1]!).getByText("u 0.35 mm (range 3)")).toBeTruthy();
  expect(within(rows[2]!).getByText("Not cut through")).toBeTruthy();
  expect(within(rows[2]!).getByText("Not acceptable")).toBeTruthy();
});

test("with none yet, the page says how to log one", async () => {
  renderPage({ routes, at: "/test-cuts", answers: { "GET /api/test-cuts": { items: [], next: null, total: 0 } } });
  expect((await screen.findByRole("link", { name: "Choose a recipe" })).getAttribute("href")).toBe("/recipes");
});

test("a recipe shows its own cuts", async () => {
  renderPage({
    routes,
    at: `/recipes/${recipe.id}`,
    answers: { [`GET /api/recipes/${recipe.id}/test-cuts`]: { items: cuts } },
  });
  expect(await screen.findByText("No dross, top edge square.")).toBeTruthy();
  expect(screen.getByText("Not cut through, heavy dross, top edge melted over.")).toBeTruthy();
  expect(screen.getByText("Measured: bevel 1.5°, u 0.35 mm (range 3).")).toBeTruthy();
});
