import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { sampleAnswers, sampleContent, sampleId, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { renderPage, testOwner } from "#tests/support/render-page.tsx";
import { RecipeListPage } from "../../../../src/features/recipes/recipe-list-page.tsx";

vi.setConfig({ testTimeout: 20_000 });

const copper = sampleRecipe({
  id: sampleId(2),
  state: "draft",
  version: sampleVersion(1, { content: sampleContent({ material: "copper", thicknessMm: 2 }, { arcVoltageV: null }) }),
});
const page = { items: [sampleRecipe(), copper], next: "further", total: 312 };

function list(at: string, more: Record<string, unknown> = {}, units: "metric" | "inch" = "metric") {
  const answers = { ...sampleAnswers, "GET /api/recipes": page, ...more };
  const routes = [{ path: "/recipes", Component: RecipeListPage }];
  const rendered = renderPage({ routes, at, answers, session: { ...testOwner, units } });
  const asked = () =>
    Object.fromEntries(rendered.sent.filter(({ path }) => path === "/api/recipes").at(-1)?.query ?? []);
  return { ...rendered, asked };
}

test("shows own values, and their peers only where there are figures", async () => {
  list("/recipes");
  const own = await screen.findByRole("row", { name: /Mild steel, 3 mm, 0.8 mm nozzle/ });
  expect(within(own).getByText("2,450")).toBeTruthy();
  expect(await within(own).findByRole("img", { name: /^Your 2,450 mm\/min is quicker than most/ })).toBeTruthy();
  // Two metrics of this group have figures; none of copper.
  expect(within(own).getAllByRole("img")).toHaveLength(2);
  expect(within(screen.getByRole("row", { name: /Copper/ })).queryByRole("img")).toBeNull();
  expect(screen.getByText("2 of 312 recipes")).toBeTruthy();
  expect(screen.getByRole("link", { name: "More" }).getAttribute("href")).toBe("/recipes?cursor=further");
});

test("asks for what the URL says, lengths read in the member's unit", async () => {
  const query =
    "q=slat&material=mild-steel&thickness=11+ga&nozzle=0.8&state=proven&sharing=counted&sort=feed&order=asc";
  const { asked } = list(`/recipes?${query}`, {}, "inch");
  await screen.findByRole("table");
  expect(asked()).toEqual({
    ...{ search: "slat", material: "mild-steel", state: "proven", sharing: "counted", nozzleMm: "0.8" },
    ...{ thicknessMm: "3.037", sort: "feed", order: "asc" }, // 11 gauge of mild steel, 0.11956 in
  });
  expect(screen.getByRole("columnheader", { name: /Feed/ }).getAttribute("aria-sort")).toBe("ascending");
});

test("a hand-edited URL is no problem", async () => {
  const { asked } = list("/recipes?material=wood&sort=luck&order=up&state=gone&machine=x");
  await screen.findByRole("table");
  expect(asked()).toEqual({ sort: "changed", order: "desc" });
});

test("a length that cannot be read says so and filters nothing", async () => {
  const { asked } = list("/recipes?thickness=thick");
  expect(await screen.findByText(/Type it like 3 mm/)).toBeTruthy();
  expect(asked().thicknessMm).toBeUndefined();
});

test("a column head orders by it and keeps that in the URL", async () => {
  const { asked, router } = list("/recipes?cursor=far");
  await userEvent.click(await screen.findByRole("button", { name: /Current/ }));
  await waitFor(() => expect(asked()).toEqual({ sort: "current", order: "asc" }));
  expect(router.state.location.search).toBe("?sort=current&order=asc");
});

test("an empty book teaches the first step", async () => {
  list("/recipes", { "GET /api/recipes": { items: [], next: null, total: 0 } });
  expect(await screen.findByText("The book is empty")).toBeTruthy();
  expect(screen.getByRole("link", { name: "Write the first recipe" }).hasAttribute("data-new")).toBe(true);
});

test("without a machine the first step is the machine", async () => {
  list("/recipes", { "GET /api/recipes": { items: [], next: null, total: 0 }, "GET /api/machines": { items: [] } });
  expect((await screen.findByRole("link", { name: "Add a machine" })).getAttribute("href")).toBe("/machines/new");
});
