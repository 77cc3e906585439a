import { readFileSync } from "node:fs";
import type { Page } from "playwright-core";
import { describe, expect } from "vitest";
import { StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { test, widths } from "#tests/support/e2e-test.ts";

async function download(page: Page, name: string): Promise<string> {
  const [file] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("link", { name, exact: true }).click(),
  ]);
  return readFileSync(await file.path(), "utf8");
}

describe.each(widths)("peers and starting recipes, %i px wide", (width) => {
  test("an owner reads the map, a group and the own book against it", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/peers" });
    const map = page.getByRole("grid", { name: /Map of peer groups: Mild steel/ });
    await map.waitFor();
    await expectUsable(page);
    await map
      .getByRole("link", { name: /shops.*of yours/ })
      .first()
      .click();
    await page.getByRole("heading", { level: 1, name: /Mild steel.*nozzle/ }).waitFor();
    await page
      .getByText(/\d shops|more shops/)
      .first()
      .waitFor();
    await expectUsable(page);
    await page.goto("/peers/book");
    await page.getByText("Most unusual first. Unusual is not wrong").waitFor();
    await expectUsable(page);
  });

  test("a group with too few shops shows nothing, and not how many", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/peers?metal=copper" });
    await page
      .getByRole("grid")
      .getByRole("link", { name: /Not enough shops yet/ })
      .first()
      .click();
    await page.getByText("Not enough shops yet").first().waitFor();
    expect(await page.getByRole("main").textContent()).not.toMatch(/\b[1-4] (of \d )?shops?\b/);
    await expectUsable(page);
  });

  test("an owner starts on aluminium, which the shop has never cut", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/start" });
    await expectUsable(page);
    await page.getByLabel("Metal").selectOption({ label: "Aluminium" });
    await page.getByRole("textbox", { name: "Thickness" }).fill("3");
    const recipe = page.getByRole("article", { name: "Starting recipe" });
    await recipe.getByRole("heading", { name: /^Aluminium, 3 mm, [\d.]+ mm nozzle$/ }).waitFor();
    await expect.poll(() => page.locator("[aria-busy=true]").count()).toBe(0);
    await recipe.getByText(/^Nozzle:/).waitFor();
    await recipe.getByText(/[\d,.]+ to [\d,.]+ mm\/min/).waitFor();
    await recipe.getByRole("heading", { name: "Before the arc is on" }).waitFor();
    await recipe
      .getByText(/hydrogen/i)
      .first()
      .waitFor();
    await recipe.getByRole("heading", { name: "First test plan" }).waitFor();
    await expectUsable(page);

    const json = StartingRecipe.parse(JSON.parse(await download(page, "JSON")));
    expect(json).toMatchObject({ material: "aluminium", thicknessMm: 3 });
    expect(json.cautions.length).toBeGreaterThan(0);
    const csv = await download(page, "CSV");
    const feedLine = csv.split("\r\n").find((line) => /feed/i.test(line));
    expect(feedLine?.split(",")).toContain(String(json.setpoints.feedMmMin.value));

    await page.emulateMedia({ media: "print" });
    expect(await recipe.getByRole("heading", { name: "Before the arc is on" }).isVisible()).toBe(true);
    expect(await page.getByRole("button", { name: "Save to book" }).isVisible()).toBe(false);
    await page.emulateMedia({ media: "screen" });

    await page.getByRole("button", { name: "Save to book" }).click();
    await page.waitForURL(/\/recipes\/[0-9a-f-]{36}$/);
    await page.getByText("Not proven").first().waitFor();
    await page
      .getByText(/^Began as a starting recipe of edition \d+\.$/)
      .first()
      .waitFor();
    await expectUsable(page);
  });
});
