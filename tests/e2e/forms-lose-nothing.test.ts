import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import {
  chooseFirstMachine,
  keptRecipeId,
  mildSteelEighth,
  recipeForm,
  typeRecipe,
  writeRecipe,
} from "#tests/support/e2e-recipes.ts";
import { chooseAccount, test, widths } from "#tests/support/e2e-test.ts";
import { expectProblem } from "#tests/support/e2e-watch.ts";

describe.each(widths)("forms lose nothing, %i px wide", (width) => {
  test("two tabs change one recipe: the second sees both and decides", async ({ signIn, newTab }) => {
    const first = await signIn("demo-owner", { width });
    const id = await writeRecipe(first);
    await first.goto(`/recipes/${id}/edit`);
    const second = await newTab(first, `/recipes/${id}/edit`);
    await typeRecipe(second, { Current: "44", "Arc voltage": "123" });

    await typeRecipe(first, { Current: "43" });
    await recipeForm(first).getByRole("button", { name: "Save as new version" }).click();
    await keptRecipeId(first);

    expectProblem(second, /409 PUT/);
    await recipeForm(second).getByRole("button", { name: "Save as new version" }).click();
    const dialog = second.getByRole("dialog", { name: "Somebody changed this recipe meanwhile" });
    const current = dialog.getByRole("row", { name: /^Current/ });
    await current.getByText("43 A").waitFor();
    await current.getByText("44 A").waitFor();
    await expectUsable(second);
    await dialog.getByRole("button", { name: "Back to the form" }).click();
    const typed = (label: string) => recipeForm(second).getByRole("textbox", { name: label, exact: true }).inputValue();
    expect([await typed("Current"), await typed("Arc voltage")]).toEqual(["44", "123"]);
    await recipeForm(second).getByRole("button", { name: "Save as new version" }).click();
    await dialog.getByRole("button", { name: "Save mine as version 3" }).click();
    await keptRecipeId(second);
    for (const version of ["Version 3", "Version 2", "Version 1"])
      await second.getByRole("listitem").filter({ hasText: version }).waitFor();
  });

  test("a session that ends while typing costs a sign-in and nothing else", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/recipes/new" });
    await chooseFirstMachine(page);
    await typeRecipe(page, mildSteelEighth);
    await recipeForm(page)
      .getByRole("textbox", { name: /^Note to self/ })
      .fill("Kept over the sign-in");
    await page.context().clearCookies();
    expectProblem(page, /401 POST \/api\/recipes/);
    await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
    await page.getByText("Your session has ended").waitFor();
    await expectUsable(page);
    await page.getByRole("link", { name: "Sign in again" }).click();
    await chooseAccount(page, "demo-owner");
    await page.getByText("This is what you typed before and did not save").waitFor();
    const typed = recipeForm(page).getByRole("textbox", { name: "Feed rate", exact: true });
    expect(await typed.inputValue()).toBe(mildSteelEighth["Feed rate"]);
    await expectUsable(page);
    await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
    await keptRecipeId(page);
    await page.getByText("Kept over the sign-in").first().waitFor();
  });

  test("two quick presses keep one recipe", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width });
    const total = () => page.evaluate(async () => (await (await fetch("/api/recipes")).json()).total as number);
    const before = await total();
    await page.goto("/recipes/new");
    await chooseFirstMachine(page);
    await typeRecipe(page, mildSteelEighth);
    await recipeForm(page).getByRole("button", { name: "Keep recipe" }).dblclick();
    await keptRecipeId(page);
    expect(await total()).toBe(before + 1);
  });
});
