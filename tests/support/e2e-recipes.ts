import type { Page } from "playwright-core";

/** What is typed into a recipe's form, by the labels of its fields; text as a person would type it. */
export type TypedRecipe = Record<string, string>;

/** Plausible for 1/8 in mild steel: the heat check passes. Mixed units, as people mix them. */
export const mildSteelEighth: TypedRecipe = {
  Thickness: "1/8",
  "Nozzle orifice": "0.8",
  Current: "45",
  "Gas pressure": "65 psi",
  "Feed rate": "95 ipm",
  "Cut height": "1.5",
  "Pierce height": "3.8",
  "Pierce delay": "0.4",
  "Arc voltage": "120",
  "Kerf width": "1.5",
};

export const recipeForm = (page: Page) => page.getByRole("form", { name: "Recipe" });

export async function typeRecipe(page: Page, typed: TypedRecipe): Promise<void> {
  for (const [label, text] of Object.entries(typed)) {
    await recipeForm(page).getByRole("textbox", { name: label, exact: true }).fill(text);
  }
}

/** The first machine of the list that is offered. */
export async function chooseFirstMachine(page: Page): Promise<void> {
  const machine = recipeForm(page).getByLabel("Machine");
  await machine.locator("option").nth(1).waitFor({ state: "attached" });
  await machine.selectOption({ index: 1 });
}

/** Waits for the page of the recipe that was kept and gives its id. */
export async function keptRecipeId(page: Page): Promise<string> {
  await page.waitForURL(/\/recipes\/[0-9a-f-]{36}$/);
  await page.getByRole("heading", { name: "History" }).waitFor();
  return page.url().slice(-36);
}

/** Writes a recipe on screen and gives its id. */
export async function writeRecipe(page: Page, typed: TypedRecipe = mildSteelEighth): Promise<string> {
  await page.goto("/recipes/new");
  await chooseFirstMachine(page);
  await typeRecipe(page, typed);
  await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
  return keptRecipeId(page);
}

/** Logs a clean cut with the recipe that is open: its newest version is proven then. */
export async function logAcceptableCut(page: Page): Promise<void> {
  await page.getByRole("main").getByRole("link", { name: "Log a test cut" }).first().click();
  const form = page.getByRole("form", { name: "Test cut" });
  const tap = (question: string, answer: string) =>
    form.getByRole("group", { name: question }).getByText(answer, { exact: true }).click();
  await tap("Cut through?", "Yes");
  await tap("Dross below", "None");
  await tap("Top edge", "Square");
  await tap("Acceptable?", "Yes");
  await form.getByRole("button", { name: "Save test cut" }).click();
  await page.getByRole("heading", { name: "History" }).waitFor();
}
