import type { Page } from "playwright-core";
import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import {
  chooseFirstMachine,
  keptRecipeId,
  logAcceptableCut,
  mildSteelEighth,
  recipeForm,
  typeRecipe,
} from "#tests/support/e2e-recipes.ts";
import { test, type Width, widths } from "#tests/support/e2e-test.ts";

const feed = (page: Page) => recipeForm(page).getByRole("textbox", { name: "Feed rate", exact: true });

/** Each figure says at once what it was understood as; then the heat check and the standing speak. */
async function seeLiveReadings(page: Page, width: Width): Promise<void> {
  const readings = [
    "= 3.18 mm", // 1/8 in x 25.4 mm/in, exactly 3.175 mm (NIST SP 811, B.8)
    "= 4.48 bar", // 65 psi x 0.0689476 bar/psi (the same)
    "= 2,413 mm/min", // 95 in/min x 25.4 mm/in
  ];
  for (const reading of readings) await recipeForm(page).getByText(reading).waitFor();
  await page.getByText("Heat check: plausible").waitFor();
  const standing =
    width === 390 ? recipeForm(page).getByRole("img", { name: /peers|shops/i }) : page.getByText(/^2,413 mm\/min: \w+/);
  await standing.first().waitFor();
}

async function writeWithOneMistake(page: Page, width: Width): Promise<void> {
  await page.getByRole("link", { name: "Write a recipe" }).click();
  await chooseFirstMachine(page);
  await typeRecipe(page, mildSteelEighth);
  await seeLiveReadings(page, width);
  await expectUsable(page);

  // 11 gauge mild steel sheet: 0.1196 in, 3.04 mm (Manufacturers' Standard Gauge, ASTM A480/A568 tables)
  await typeRecipe(page, { Thickness: "11 ga", "Feed rate": "95 ipn" });
  await recipeForm(page).getByText("= 3.04 mm").waitFor();
  await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
  await expect.poll(() => feed(page).getAttribute("aria-invalid")).toBe("true");
  expect(await feed(page).inputValue()).toBe("95 ipn");
  expect(await recipeForm(page).getByRole("textbox", { name: "Thickness" }).inputValue()).toBe("11 ga");
  await expectUsable(page);
  await typeRecipe(page, { "Feed rate": "95 ipm" });
  await recipeForm(page).getByRole("button", { name: "Keep recipe" }).click();
  await keptRecipeId(page);
}

async function share(page: Page): Promise<void> {
  const panel = page.getByRole("region", { name: /^Sharing/ });
  await panel.getByRole("radio", { name: "Counted" }).check();
  await panel.getByRole("heading", { name: "What others see" }).waitFor();
  await panel.getByRole("heading", { name: "What stays here" }).waitFor();
  await panel.getByText("No figure of it is shown by itself").waitFor();
  await panel.getByText("Brackenhold Plate").first().waitFor();
  await expectUsable(page);
  await panel.getByRole("button", { name: "Have it counted" }).click();
  await page.getByRole("heading", { name: "Sharing: counted" }).waitFor();

  await panel.getByRole("radio", { name: "Listed" }).check();
  const words = panel.getByRole("textbox", { name: /^Words for others/ });
  await words.fill("Questions to owner@brackenhold.example");
  await panel.getByText(/holds an e-mail address/).waitFor();
  expect(await panel.getByRole("button", { name: "List it" }).isDisabled()).toBe(true);
  await expectUsable(page);
  await words.fill("Dry air mattered more here than current.");
  await panel.getByRole("definition").filter({ hasText: "Dry air mattered" }).waitFor();
  await panel.getByRole("button", { name: "List it" }).click();
  await page.getByRole("heading", { name: "Sharing: listed" }).waitFor();
}

async function changeAndProveAgain(page: Page): Promise<void> {
  await page.getByRole("link", { name: "Change", exact: true }).click();
  await typeRecipe(page, { "Feed rate": "2.3 m/min" });
  await recipeForm(page)
    .getByRole("textbox", { name: /^Reason/ })
    .fill("less dross");
  await expectUsable(page);
  await recipeForm(page).getByRole("button", { name: "Save as new version" }).click();
  await page.getByText("Not counted now").waitFor();
  await expectUsable(page);
  await logAcceptableCut(page);
  await page.getByRole("listitem").filter({ hasText: "Version 2" }).getByText("Proven").waitFor();
  await expect.poll(() => page.getByText("Not counted now").count()).toBe(0);
}

async function compareVersions(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Compare", exact: true }).click();
  await page.getByRole("heading", { level: 1, name: "Two versions side by side" }).waitFor();
  const row = page.getByRole("row", { name: /Feed rate/ });
  await row.getByText("(differs)").waitFor();
  await row.getByText("2,413 mm/min").waitFor();
  await row.getByText("2,300 mm/min").waitFor();
  await expectUsable(page);
  await page.goBack();
}

describe.each(widths)("an owner's book, %i px wide", (width) => {
  test("from the first typing through proof, sharing and change to withdrawal", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width });
    await expectUsable(page);
    await writeWithOneMistake(page, width);
    await page.getByText("Not proven").first().waitFor();
    await expectUsable(page);
    await logAcceptableCut(page);
    await page.getByText("Proven", { exact: true }).first().waitFor();
    await share(page);
    await changeAndProveAgain(page);
    await compareVersions(page);
    await page.getByRole("button", { name: "Withdraw" }).click();
    await expectUsable(page);
    await page.getByRole("dialog").getByRole("button", { name: "Withdraw" }).click();
    await page.getByRole("heading", { name: "Sharing: private" }).waitFor();
  });

  test("prints a setup sheet with its cautions", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width });
    await page
      .getByRole("main")
      .getByRole("link", { name: /nozzle$/ })
      .first()
      .click();
    await page.getByRole("heading", { name: "History" }).waitFor();
    await page.emulateMedia({ media: "print" });
    await page.getByRole("heading", { name: "Cautions" }).waitFor();
    await page.getByText("ANSI Z49.1").first().waitFor();
    expect(await page.getByRole("button", { name: "Retire" }).isVisible()).toBe(false);
    expect(await page.getByRole("navigation").first().isVisible()).toBe(false);
  });

  test("is shown the own test cuts", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/test-cuts" });
    await page.getByRole("heading", { level: 1, name: "Test cuts" }).waitFor();
    await expectUsable(page);
  });
});
