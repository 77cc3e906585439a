import type { Page } from "playwright-core";
import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { chooseAccount, test, type Width, widths } from "#tests/support/e2e-test.ts";
import { expectRefusal } from "#tests/support/e2e-watch.ts";

/** The visitor's address is the demo account's, so that the decision is read after signing in. */
async function askToJoin(page: Page, shopName: string): Promise<void> {
  await page.getByLabel("Shop", { exact: true }).fill(shopName);
  await page.getByLabel("Where it is").fill("East Wanderlea");
  await page.getByLabel("What the shop cuts").fill("Nothing yet, the table is on its way");
  await page.getByRole("button", { name: "Send application" }).click();
  await page.getByRole("heading", { level: 1, name: "Your application is in" }).waitFor();
}

const waiting = (page: Page, shopName: string) => page.getByRole("article", { name: shopName });

/** One after another, for each width its own shop: what is decided stays decided. */
const suspended: Record<Width, { account: "demo-owner" | "demo-new-owner"; shop: string }> = {
  1280: { account: "demo-owner", shop: "Brackenhold Plate" },
  390: { account: "demo-new-owner", shop: "Fernlatch Yard" },
};

describe.each(widths)("a network admin, %i px wide", (width) => {
  test("declines an application with a reason, and the applicant reads it", async ({ signIn }) => {
    const shopName = `Wanderlea Trial ${width}`;
    const applicant = await signIn("demo-visitor", { width, at: "/" });
    await expectUsable(applicant);
    await askToJoin(applicant, shopName);
    await applicant.getByRole("link", { name: "See where it stands" }).click();
    await applicant.getByRole("heading", { level: 1, name: "Your application waits" }).waitFor();
    await expectUsable(applicant);

    const admin = await signIn("demo-admin", { width, at: "/applications" });
    await waiting(admin, shopName).getByRole("button", { name: "Decline" }).click();
    const dialog = admin.getByRole("dialog");
    await dialog.getByRole("button", { name: "Decline the application" }).click();
    await dialog.getByText("Give a reason the applicant can use").waitFor();
    await expectUsable(admin);
    await dialog.getByRole("textbox", { name: "Reason" }).fill("Ask again once the table has cut its first sheet");
    await dialog.getByRole("button", { name: "Decline the application" }).click();
    await expect.poll(() => waiting(admin, shopName).count()).toBe(0);
    await expectUsable(admin);

    await applicant.goto("/");
    await applicant.getByText("Ask again once the table has cut its first sheet").waitFor();
    await expectUsable(applicant);
  });

  test("finds members by name and place", async ({ signIn }) => {
    const page = await signIn("demo-admin", { width, at: "/members" });
    await expectUsable(page);
    await page.getByRole("searchbox", { name: "Search" }).fill("brackenhold");
    await page.getByText("1 shop", { exact: true }).waitFor();
    await page.getByText("Brackenhold Plate").first().waitFor();
    await page.getByRole("searchbox", { name: "Search" }).fill("no such shop");
    await page.getByText("No member fits").waitFor();
    await expectUsable(page);
  });

  test("suspends a shop whose owner is at work, and takes it back", async ({ signIn }) => {
    const { account, shop } = suspended[width];
    const owner = await signIn(account, { width, at: "/recipes" });
    const admin = await signIn("demo-admin", { width, at: `/members?search=${encodeURIComponent(shop)}` });
    await admin.getByRole("button", { name: `Suspend ${shop}` }).click();
    await admin.getByRole("textbox", { name: "Reason" }).fill("A rehearsal of suspending");
    await expectUsable(admin);
    await admin.getByRole("button", { name: "Suspend the shop" }).click();
    await admin.getByRole("button", { name: `Reinstate ${shop}` }).waitFor();

    expectRefusal(owner, "(Sign in first|Your shop is suspended)", /40[13] GET \/api\//);
    await owner.getByRole("navigation").getByRole("link", { name: "Test cuts" }).filter({ visible: true }).click();
    await owner.getByRole("heading", { level: 1, name: /Sign in first|is suspended/ }).waitFor();
    await expectUsable(owner);
    await owner.getByRole("main").getByRole("link", { name: "Sign in" }).click();
    await chooseAccount(owner, account);
    await owner.goto("/");
    await owner.getByRole("heading", { level: 1, name: `${shop} is suspended` }).waitFor();

    await admin.getByRole("button", { name: `Reinstate ${shop}` }).click();
    await expectUsable(admin);
    await admin.getByRole("button", { name: "Reinstate the shop" }).click();
    await admin.getByRole("button", { name: `Suspend ${shop}` }).waitFor();
    await owner.goto("/recipes");
    await owner.getByRole("heading", { level: 1, name: "Recipes" }).waitFor();
  });

  test("builds an edition, reads what it changes and publishes it to the members", async ({ signIn }) => {
    const member = await signIn("demo-owner", { width, at: "/peers" });
    const current = () =>
      member.evaluate(async () => (await (await fetch("/api/editions/current")).json()).edition.number as number);
    const before = await current();

    const admin = await signIn("demo-second-admin", { width, at: "/editions" });
    await expectUsable(admin);
    await admin.getByRole("button", { name: "Build an edition" }).click();
    await admin.getByRole("progressbar").waitFor();
    const built = admin.getByRole("heading", { name: /^Edition \d+ is built and waits$/ });
    await built.waitFor({ timeout: 60_000 });
    const number = Number((await built.textContent())?.match(/\d+/)?.[0]);
    expect(number).toBeGreaterThan(before);
    expect(await current()).toBe(before);
    await expectUsable(admin);
    await admin.getByRole("button", { name: /^Publish/ }).click();
    await admin
      .getByRole("dialog")
      .getByText(/stays? as (it was|they were)|No group changes|groups? (appear|change|is held|are held)/)
      .first()
      .waitFor();
    await expectUsable(admin);
    await admin.getByRole("button", { name: `Publish edition ${number}` }).click();
    await expect.poll(() => built.count()).toBe(0);
    await admin.getByText("Current", { exact: true }).waitFor();
    expect(await current()).toBe(number);
    await member.goto("/peers");
    await member.getByRole("grid").waitFor();
  });
});

test("admits Osterhollow, whose applicant then owns the new shop", async ({ signIn }) => {
  const applicant = await signIn("demo-applicant", { width: 390, at: "/" });
  await applicant.getByRole("heading", { level: 1, name: "Your application waits" }).waitFor();

  const admin = await signIn("demo-admin", { width: 1280, at: "/applications" });
  await expectUsable(admin);
  await waiting(admin, "Osterhollow Fabrication").getByRole("button", { name: "Admit" }).click();
  await expectUsable(admin);
  await admin.getByRole("button", { name: "Admit the shop" }).click();
  await expect.poll(() => waiting(admin, "Osterhollow Fabrication").count()).toBe(0);

  await applicant.goto("/");
  await applicant.getByText("First the machine, then its recipes").waitFor();
  await expectUsable(applicant);
  await applicant.getByRole("link", { name: "Add a machine" }).waitFor();
});
