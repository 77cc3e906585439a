import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { sampleCut, sampleRecipe, sampleVersion } from "#tests/support/recipe-samples.ts";
import { Refusal, renderPage } from "#tests/support/render-page.tsx";
import { NewTestCutPage } from "../../../../src/features/test-cuts/new-test-cut-page.tsx";
import { readPlain } from "../../../../src/features/test-cuts/test-cut-form-values.ts";

vi.setConfig({ testTimeout: 20_000 });

const recipe = sampleRecipe({ state: "draft", version: sampleVersion(3, { proven: false }) });
const at = `/recipes/${recipe.id}/test-cuts/new`;
const post = `POST /api/recipes/${recipe.id}/test-cuts`;
const routes = [
  { path: "/recipes/:id/test-cuts/new", Component: NewTestCutPage },
  { path: "/recipes/:id", element: <h1>The recipe's page</h1> },
];
const show = (answer: unknown = sampleCut()) =>
  renderPage({ routes, at, answers: { [`GET /api/recipes/${recipe.id}`]: recipe, [post]: answer } });

async function tap(question: string, answer: string) {
  const group = await screen.findByRole("group", { name: question });
  await userEvent.click(within(group).getByRole("radio", { name: answer }));
}
const save = () => userEvent.click(screen.getByRole("button", { name: "Save test cut" }));
const fill = async (name: RegExp, text: string) => {
  await userEvent.clear(screen.getByRole("textbox", { name, hidden: true }));
  await userEvent.paste(text);
};

afterEach(() => sessionStorage.clear());

test("four taps log a cut of the newest version, made now", async () => {
  const before = Date.now();
  const { sent } = show();
  await tap("Cut through?", "Yes");
  await tap("Dross below", "Light");
  await tap("Top edge", "Square");
  await tap("Acceptable?", "Yes");
  await save();
  expect(await screen.findByText("Logged. The recipe is proven.")).toBeTruthy();
  const { cutAt, ...cut } = sent.find(({ method }) => method === "POST")!.body as { cutAt: string };
  expect(cut).toEqual({
    ...{ versionNumber: 3, cutThrough: true, dross: "light", topEdge: "square", acceptable: true, note: "" },
    ...{ bevelDeg: null, kerfWidthMm: null, uMm: null, rz5Um: null },
  });
  // The field holds whole minutes.
  expect(Math.abs(Date.parse(cutAt) - before)).toBeLessThan(2 * 60_000);
});

test("judges nothing for the operator: every question left open is asked for", async () => {
  const { sent } = show();
  await screen.findByRole("group", { name: "Cut through?" });
  await save();
  for (const question of ["Did it cut through?", "How much dross?", "Would you hand this part over?"]) {
    expect(await screen.findByText(question)).toBeTruthy();
  }
  expect(sent.some(({ method }) => method === "POST")).toBe(false);
});

test("what did not cut through is not acceptable", async () => {
  show();
  await tap("Cut through?", "No");
  const acceptable = screen.getByRole("group", { name: "Acceptable?" });
  const radio = (name: string) => within(acceptable).getByRole<HTMLInputElement>("radio", { name });
  await waitFor(() => expect(radio("No").checked).toBe(true));
  expect(radio("Yes").disabled).toBe(true);
});

test("shows the ISO 9013 range while it is typed", async () => {
  show();
  await screen.findByRole("group", { name: "Cut through?" });
  // ISO 9013:2017 at 3 mm: u range 3 ends at 0.4 + 0.01 × 3 = 0.43 mm, Rz5 range 2 at 40 + 0.8 × 3 = 42.4 µm
  await fill(/^u, out of square/, "0.43");
  expect(screen.getByText("= 0.43 mm: ISO 9013 range 3")).toBeTruthy();
  await fill(/^u, out of square/, "0.44");
  expect(screen.getByText("= 0.44 mm: ISO 9013 range 4")).toBeTruthy();
  await fill(/^Rz5/, "42,5");
  expect(screen.getByText("= 42.5 µm: ISO 9013 range 3")).toBeTruthy();
});

test("a refusal of the server stands at its field", async () => {
  show(
    new Refusal("invalid-request", {
      errors: [{ pointer: "/cutAt", detail: "A test cut cannot lie in the future" }],
    }),
  );
  await tap("Cut through?", "No");
  await tap("Dross below", "Heavy");
  await tap("Top edge", "Rounded");
  await save();
  expect(await screen.findByText("A test cut cannot lie in the future")).toBeTruthy();
});

test.each([
  ["-1,5", { ok: true, value: -1.5 }],
  ["2°", { ok: true, value: 2 }],
  ["", { ok: true, value: null }],
  ["46", { ok: false, problem: "Allowed: -45 to 45 °" }],
  ["steep", { ok: false, problem: "Allowed: -45 to 45 °" }],
])("reads a bevel of %j", (text, read) => {
  expect(readPlain(text, { min: -45, max: 45, unit: "°" })).toEqual(read);
});
