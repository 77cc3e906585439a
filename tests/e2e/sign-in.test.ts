import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { chooseAccount, product, test, widths } from "#tests/support/e2e-test.ts";
import { expectProblem } from "#tests/support/e2e-watch.ts";

describe.each(widths)("signing in and out, %i px wide", (width) => {
  test("goes from the landing page by the provider's to the own book", async ({ open }) => {
    const page = await open({ width });
    await expectUsable(page);
    await page.getByRole("main").getByRole("link", { name: "Sign in" }).click();
    await page.getByRole("heading", { name: "Demo sign-in" }).waitFor();
    await expectUsable(page);
    await chooseAccount(page, "demo-owner");
    await page.getByRole("heading", { level: 1, name: "Recipes" }).waitFor();
    await page.getByRole("button", { name: /^Brackenhold Plate.*menu$/ }).click();
    await page.getByRole("link", { name: "Machines" }).waitFor();
    await expectUsable(page);
  });

  test("ends the session here and at the provider", async ({ signIn }) => {
    const page = await signIn("demo-owner", { width, at: "/machines" });
    await page.getByRole("button", { name: /: menu$/ }).click();
    await page.getByRole("button", { name: "Sign out" }).click();
    await page.getByRole("heading", { name: "Sign out?" }).waitFor();
    await expectUsable(page);
    await page.getByRole("button", { name: "Sign out here too" }).click();
    await page.waitForURL(`${product.address}/`);
    await page.getByRole("link", { name: "Sign in" }).first().waitFor();
    const session = await page.evaluate(async () => (await fetch("/api/session")).json());
    expect(session).toMatchObject({ user: null, shop: null, admin: false });
  });

  test("says so when it was stopped at the provider", async ({ open }) => {
    const page = await open({ width, at: "/auth/sign-in?returnTo=/recipes" });
    await page.getByRole("button", { name: "Cancel" }).click();
    await page.waitForURL(`${product.address}/?sign-in=cancelled`);
    await page.getByText("You are not signed in").waitFor();
    await expectUsable(page);
  });

  test("shows a suspended shop's owner that it is suspended, and nothing else", async ({ signIn }) => {
    const page = await signIn("demo-suspended-owner", { width, at: "/" });
    await page.getByRole("heading", { level: 1, name: "Quillmoor Cutting is suspended" }).waitFor();
    await expectUsable(page);
    expectProblem(page, /403 GET \/api\/machines/);
    expect(await page.evaluate(async () => (await fetch("/api/machines")).status)).toBe(403);
  });
});
