import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { test, widths } from "#tests/support/e2e-test.ts";

describe.each(widths)("a visitor, %i px wide", (width) => {
  test("reads what it is, how names stay hidden, the method and the cautions", async ({ open }) => {
    const page = await open({ width });
    await page.getByRole("heading", { name: "How names stay hidden" }).waitFor();
    await page.getByText("Example, figures invented").waitFor();
    await page.getByRole("link", { name: "The method in full" }).click();
    await page.waitForURL(/\/method/);
    await expectUsable(page);
    await page.goto("/");
    await page.getByRole("main").getByRole("link", { name: "Cautions" }).click();
    await page.waitForURL(/\/cautions/);
    await page.getByText("ANSI Z49.1").first().waitFor();
    await expectUsable(page);
  });

  test("asks to join: what is wrong is said at its field, then the application is in", async ({ open }) => {
    const page = await open({ width });
    await page.getByRole("link", { name: "Ask to join" }).first().click();
    await page.getByLabel("Shop", { exact: true }).fill(`Wanderlea Works ${width}`);
    await page.getByLabel("E-mail address").fill("nowhere");
    await page.getByLabel("CNC plasma tables").fill("none");
    await page.getByRole("button", { name: "Send application" }).click();
    await page.getByText("Give an e-mail address such as name@shop.example").waitFor();
    await page.getByText("A whole number of tables, 1 to 99").waitFor();
    expect(await page.getByLabel("Shop", { exact: true }).inputValue()).toBe(`Wanderlea Works ${width}`);
    await expectUsable(page);
    await page.getByLabel("Where it is").fill("Nether Wanderlea");
    await page.getByLabel("Your name").fill("Wander Lea");
    await page.getByLabel("E-mail address").fill(`ask-${width}@wanderlea.example`);
    await page.getByLabel("CNC plasma tables").fill("2");
    await page.getByLabel("What the shop cuts").fill("Sheet up to 6 mm for farm repairs");
    await page.getByRole("button", { name: "Send application" }).click();
    await page.getByRole("heading", { level: 1, name: "Your application is in" }).waitFor();
    await expectUsable(page);
  });

  test("is told when an address leads nowhere", async ({ open }) => {
    const page = await open({ width, at: "/no-such-page" });
    await page.getByRole("heading", { level: 1, name: "There is nothing here" }).waitFor();
    await expectUsable(page);
  });
});
