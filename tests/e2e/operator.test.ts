import { describe, expect } from "vitest";
import { expectUsable } from "#tests/support/e2e-axe.ts";
import { logAcceptableCut } from "#tests/support/e2e-recipes.ts";
import { test, widths } from "#tests/support/e2e-test.ts";
import { expectProblem, expectRefusal } from "#tests/support/e2e-watch.ts";

const send = async ({ path, method, body }: { path: string; method: string; body: unknown }) => {
  const headers = { "Content-Type": "application/json", "X-Tempermark": "1", "Idempotency-Key": crypto.randomUUID() };
  return (await fetch(path, { method, headers, body: JSON.stringify(body) })).status;
};

describe.each(widths)("an operator, %i px wide", (width) => {
  test("finds a recipe by its words, logs a cut in a few taps, and decides nothing for the shop", async ({
    signIn,
  }) => {
    const page = await signIn("demo-operator", { width });
    await page.getByRole("searchbox", { name: "Search" }).fill("stainless");
    await page.waitForURL(/q=stainless/);
    const found = page.getByRole("main").getByRole("link", { name: /^Stainless steel.*nozzle$/ });
    await found.first().waitFor();
    await expect.poll(() => page.getByRole("link", { name: /^Mild steel.*nozzle$/ }).count()).toBe(0);
    await expectUsable(page);
    await found.first().click();
    await page.getByRole("heading", { name: "History" }).waitFor();
    const id = page.url().slice(-36);

    await logAcceptableCut(page);
    await page.getByText("Tam Sparrowgate").first().waitFor();
    await expectUsable(page);

    for (const act of [/^Retire/, /^Have it counted/, /^List it/, /^Withdraw/])
      expect(await page.getByRole("button", { name: act }).count()).toBe(0);
    await page.getByText("An owner of the shop decides this.").waitFor();
    const share = { path: `/api/recipes/${id}/sharing`, method: "PUT", body: { level: "counted", publicText: "" } };
    const retire = { path: `/api/recipes/${id}/retirement`, method: "POST", body: {} };
    expectProblem(page, /403 PUT .*\/sharing/, /403 POST .*\/retirement/);
    expect(await page.evaluate(send, share)).toBe(403);
    expect(await page.evaluate(send, retire)).toBe(403);
  });

  test("is refused the pages of the network's admins", async ({ signIn }) => {
    const page = await signIn("demo-operator", { width, at: "/recipes" });
    expectRefusal(page, "Your role does not allow this", /403 GET \/api\/members/);
    await page.goto("/members");
    await page.getByRole("heading", { level: 1, name: "Your role does not allow this" }).waitFor();
    await expectUsable(page);
  });
});
