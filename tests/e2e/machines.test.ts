import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { test, widths } from "#tests/support/e2e-test.ts";

describe.each(widths)("machines, %i px wide", (width) => {
  test("an owner describes one in mixed units and removes it", async ({ signIn }) => {
    const name = `Long bed ${width}`;
    const page = await signIn("demo-owner", { width, at: "/machines" });
    await expectUsable(page);
    await page.getByRole("link", { name: "Add a machine" }).click();
    await page.getByLabel("Name").fill(name);
    await page.getByLabel("Power source, largest current").fill("85");
    await page.getByLabel("Air pressure at the torch").fill("65 psi");
    await page.getByText("= 4.48 bar").waitFor(); // 65 psi x 0.0689476 bar/psi (NIST SP 811, B.8)
    await page.getByLabel("Top feed").fill("fast");
    await page.getByRole("button", { name: "Keep machine" }).click();
    await expect.poll(() => page.getByLabel("Top feed").getAttribute("aria-invalid")).toBe("true");
    await expectUsable(page);
    expect(await page.getByLabel("Name").inputValue()).toBe(name);
    await page.getByLabel("Top feed").fill("400 ipm");
    await page.getByRole("button", { name: "Keep machine" }).click();
    await page.getByRole("link", { name }).click();
    await page.getByRole("heading", { level: 1, name }).waitFor();
    await expectUsable(page);
    await page.getByRole("button", { name: "Remove" }).click();
    await expectUsable(page);
    await page.getByRole("button", { name: "Remove machine" }).click();
    await page.getByRole("heading", { level: 1, name: "Machines" }).waitFor();
    await expect.poll(() => page.getByRole("link", { name }).count()).toBe(0);
  });

  test("an operator reads them and changes nothing", async ({ signIn }) => {
    const page = await signIn("demo-operator", { width, at: "/machines" });
    const machine = page.getByRole("main").getByRole("link").first();
    const name = (await machine.textContent()) ?? "";
    expect(await page.getByRole("link", { name: "Add a machine" }).count()).toBe(0);
    await machine.click();
    await page.getByRole("heading", { level: 1, name }).waitFor();
    await expectUsable(page);
    expect(await page.getByRole("main").getByRole("button").count()).toBe(0);
    expect(await page.getByRole("main").getByRole("textbox").count()).toBe(0);
  });
});
