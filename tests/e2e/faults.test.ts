import type { Page } from "playwright-core";
import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { whileDatabaseIsAway, whileProviderHangs } from "#tests/support/e2e-faults.ts";
import { mildSteelEighth, recipeForm, typeRecipe } from "#tests/support/e2e-recipes.ts";
import { chooseAccount, product, test, widths } from "#tests/support/e2e-test.ts";
import { expectProblem, expectRefusal } from "#tests/support/e2e-watch.ts";

/** What the API logs of a request that reached no database, and nothing besides. */
const withoutDatabase = /"problem":"database-unavailable"|"status":503/;

/** Chooses the owner and follows the provider's redirects up to the address that brings the code to the product. */
async function walkToCallback(page: Page): Promise<string> {
  let answer = await page.request.post(page.url(), { form: { sub: "demo-owner" }, maxRedirects: 0 });
  for (;;) {
    const next = new URL(answer.headers().location ?? "", answer.url());
    if (next.origin === product.address) return next.href;
    answer = await page.request.get(next.href, { maxRedirects: 0 });
  }
}

describe.each(widths)("faults, %i px wide", (width) => {
  test("a page says that the database is away, and comes back by itself", async ({ signIn, provoked }) => {
    provoked.push(withoutDatabase);
    const page = await signIn("demo-owner", { width, at: "/machines" });
    await page.getByRole("heading", { level: 1, name: "Machines" }).waitFor();
    expectRefusal(page, "The database does not answer", /503 GET \/api\//);
    await whileDatabaseIsAway(async () => {
      await page.getByRole("navigation").getByRole("link", { name: "Test cuts" }).filter({ visible: true }).click();
      await page.getByText("Trying again…").waitFor();
      await page.getByRole("heading", { level: 1, name: "The database does not answer." }).waitFor();
      await expectUsable(page);
    });
    await page.getByRole("heading", { level: 1, name: "Test cuts" }).waitFor({ timeout: 30_000 });
  });

  test("a form keeps what is typed while the database is away", async ({ signIn, provoked }) => {
    provoked.push(withoutDatabase);
    const page = await signIn("demo-owner", { width, at: "/recipes/new" });
    await recipeForm(page).getByLabel("Machine").selectOption({ index: 1 });
    await typeRecipe(page, mildSteelEighth);
    expectProblem(page, /503 POST \/api\/recipes/);
    await whileDatabaseIsAway(async () => {
      await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
      await page.getByText("what you typed is still here").waitFor();
    });
    await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
    await page.waitForURL(/\/recipes\/[0-9a-f-]{36}$/);
  });

  test("the landing page says that signing in does not work just now", async ({ open }) => {
    const page = await open({ width, at: "/auth/sign-in?returnTo=/recipes" });
    const callback = await walkToCallback(page);
    await whileProviderHangs(async () => {
      await page.goto(callback, { timeout: 60_000 });
    });
    await page.getByText("Signing in does not work just now").waitFor();
    await expectUsable(page);
    await page.getByRole("main").getByRole("link", { name: "Sign in again" }).click();
    await chooseAccount(page, "demo-owner");
    await page.getByRole("heading", { level: 1, name: "Recipes" }).waitFor();
    expect(new URL(page.url()).pathname).toBe("/recipes");
  });
});
