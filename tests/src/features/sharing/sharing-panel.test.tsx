import { screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test } from "vitest";
import type { Recipe } from "#shared/contracts/recipes.ts";
import type { Sharing, SharingPreview } from "#shared/contracts/sharing.ts";
import { sampleContent, sampleRecipe } from "#tests/support/recipe-samples.ts";
import { renderPage, type SentRequest, testOwner } from "#tests/support/render-page.tsx";
import { SharingPanel } from "../../../../src/features/sharing/sharing-panel.tsx";

const listed: NonNullable<SharingPreview["listed"]> = {
  material: "mild-steel",
  thicknessMm: 3,
  nozzleMm: 0.8,
  gas: "air",
  setpoints: sampleContent({}, { feedMmMin: 2450 }).setpoints,
  quarter: "2026-Q4",
  text: null,
  traits: { startMethod: "contact", dryness: null, heightControl: null },
};
const preview = (level: SharingPreview["level"], text: string | null = null): SharingPreview => ({
  level,
  counts: level !== "private",
  groupLabel: "Mild steel, 3.15 mm band, 0.8 mm nozzle, compressed air",
  listed: level === "listed" ? { ...listed, text } : null,
  staysHere: [{ what: "Shop", value: "Brackenhold" }],
});
const sharingAt = (level: Sharing["level"], more: Partial<Sharing> = {}): Sharing => ({
  level,
  publicText: "",
  notCountedBecause: null,
  previews: [preview("private"), preview("counted"), preview("listed")],
  ...more,
});

function show(sharing: Sharing, more: Partial<Recipe> = {}, session = testOwner) {
  const recipe = sampleRecipe(more);
  const path = `/api/recipes/${recipe.id}/sharing`;
  let now = sharing;
  return renderPage({
    routes: [{ path: "/", element: <SharingPanel recipe={recipe} /> }],
    at: "/",
    session,
    answers: {
      [`GET ${path}`]: () => now,
      [`PUT ${path}`]: ({ body }: SentRequest) => {
        now = sharingAt((body as Sharing).level);
        return now;
      },
      [`POST ${path}-preview`]: ({ body }: SentRequest) => {
        const text = (body as Sharing).publicText;
        const refused = text.includes("Brackenhold");
        return {
          preview: preview("listed", refused ? null : text),
          textRefused: refused ? ["It holds your shop's name or part of it"] : [],
        };
      },
    },
  });
}

const choose = async (level: string) => userEvent.click(await screen.findByRole("radio", { name: level }));
const column = (name: string) => screen.getByRole("heading", { name }).closest("section")!;
const saves = (sent: SentRequest[]) => sent.filter(({ method }) => method === "PUT").map(({ body }) => body);

test("shows what each level would show before anything is saved", async () => {
  const { sent } = show(sharingAt("private"));
  await screen.findByText("Sharing: private");
  expect(column("What others see").textContent).toContain("Nothing.");
  await choose("Counted");
  expect(column("What others see").textContent).toContain("No figure of it is shown by itself.");
  await choose("Listed");
  expect(within(column("What others see")).getByText("2,450 mm/min")).toBeTruthy();
  expect(column("What others see").textContent).not.toContain("Brackenhold");
  expect(within(column("What stays here")).getByText("Brackenhold")).toBeTruthy();
  expect(saves(sent)).toEqual([]);
});

test("an owner shares at the level chosen", async () => {
  const { sent } = show(sharingAt("private"));
  await choose("Counted");
  await userEvent.click(screen.getByRole("button", { name: "Have it counted" }));
  expect(await screen.findByText("Sharing: counted")).toBeTruthy();
  expect(saves(sent)).toEqual([{ level: "counted", publicText: "" }]);
});

test("words for others are tried out while typed, and telling ones are refused before they are sent", async () => {
  const { sent } = show(sharingAt("private"));
  await choose("Listed");
  const words = screen.getByRole("textbox", { name: /Words for others/ });
  await userEvent.click(words);
  await userEvent.paste("Ask Brackenhold");
  expect(await screen.findByText("It holds your shop's name or part of it. Take it out.")).toBeTruthy();
  expect(screen.getByRole<HTMLButtonElement>("button", { name: "List it" }).disabled).toBe(true);
  await userEvent.clear(words);
  await userEvent.paste("Clean the slats first");
  expect(await within(column("What others see")).findByText("Clean the slats first")).toBeTruthy();
  await userEvent.click(screen.getByRole("button", { name: "List it" }));
  await screen.findByText("Sharing: listed");
  expect(saves(sent)).toEqual([{ level: "listed", publicText: "Clean the slats first" }]);
});

test("withdrawing asks first, and says that published editions stay", async () => {
  const { sent } = show(sharingAt("listed"));
  await userEvent.click(await screen.findByRole("button", { name: "Withdraw" }));
  const dialog = await screen.findByRole("dialog");
  expect(dialog.textContent).toContain("Editions already published stay as they are.");
  await userEvent.click(within(dialog).getByRole("button", { name: "Withdraw" }));
  expect(await screen.findByText("Sharing: private")).toBeTruthy();
  expect(saves(sent)).toEqual([{ level: "private" }]);
});

test("says why a shared recipe is not counted", async () => {
  show(sharingAt("counted", { notCountedBecause: "newer-recipe-counts" }));
  expect(await screen.findByText(/Of each machine only the newest counts/)).toBeTruthy();
});

test("a recipe not proven can be looked at in every level but not shared", async () => {
  show(sharingAt("private"), { state: "draft" });
  await choose("Counted");
  expect(screen.getByText("Log an acceptable test cut first.")).toBeTruthy();
  expect(screen.queryByRole("button", { name: "Have it counted" })).toBeNull();
});

test("an operator sees it and changes nothing", async () => {
  show(sharingAt("listed"), {}, { ...testOwner, shop: { ...testOwner.shop!, role: "operator" } });
  expect(await screen.findByText("An owner of the shop decides this.")).toBeTruthy();
  expect(screen.queryByRole("button", { name: "Withdraw" })).toBeNull();
});
