import type { Browser, BrowserContext, Page } from "playwright-core";
import { test as base, expect, inject } from "vitest";
import type { demoAccounts } from "#oidc-fake/accounts.ts";
import { launchChromium } from "./chromium.ts";
import { takeNewErrors } from "./e2e-logs.ts";
import { unexpectedOf, type Watch, watchPage } from "./e2e-watch.ts";

export type Account = (typeof demoAccounts)[number]["sub"];

/** A desk's screen and a phone's, in CSS pixels. */
export const widths = [1280, 390] as const;
export type Width = (typeof widths)[number];

export const product = inject("product");

interface OpenOptions {
  width: Width;
  /** The page to begin at. */
  at?: string;
}

async function openContext(browser: Browser, width: Width): Promise<BrowserContext> {
  const phone = width === 390;
  const context = await browser.newContext({
    baseURL: product.address,
    viewport: { width, height: phone ? 844 : 800 },
    isMobile: phone,
    hasTouch: phone,
    reducedMotion: "reduce",
    locale: "en-GB",
    timezoneId: "UTC",
  });
  context.setDefaultTimeout(15_000);
  return context;
}

/** Chooses a person on the provider's page and waits until the product is back. */
export async function chooseAccount(page: Page, account: Account): Promise<void> {
  await page.locator(`button[value="${account}"]`).click();
  await page.waitForURL((url) => url.origin === product.address);
}

async function openTab(page: Page, at: string): Promise<Page> {
  const tab = await page.context().newPage();
  await tab.goto(at);
  return tab;
}

/**
 * Tests of the whole product. Each fails by itself where a page logged, refused or broke anything unforeseen, or where a
 * server logged an error meanwhile.
 * `open` opens a browser of its own for somebody who has not signed in, `signIn` the same for somebody who has, by way of
 * the provider's page; `newTab` is another tab of the same browser.
 * `provoked` takes the errors in the servers' logs that the test provokes; everything else fails it.
 */
export const test = base
  .extend("launch", { scope: "file" }, () => launchChromium)
  .extend("browser", { scope: "file" }, async ({ launch }, { onCleanup }) => {
    const browser = await launch();
    onCleanup(() => browser.close());
    return browser;
  })
  .extend("provoked", (): RegExp[] => [])
  .extend("open", async ({ browser, provoked }, { onCleanup }) => {
    const contexts: BrowserContext[] = [];
    const watches: Watch[] = [];
    onCleanup(async () => {
      await Promise.all(contexts.map((context) => context.close()));
      expect(watches.flatMap(unexpectedOf)).toEqual([]);
      const errors = takeNewErrors(product.folder);
      expect(errors.filter((line) => !provoked.some((pattern) => pattern.test(line)))).toEqual([]);
    });
    return async ({ width, at = "/" }: OpenOptions): Promise<Page> => {
      const context = await openContext(browser, width);
      contexts.push(context);
      context.on("page", (page) => watches.push(watchPage(page)));
      const page = await context.newPage();
      await page.goto(at);
      return page;
    };
  })
  .extend("signIn", ({ open }) => async (account: Account, { width, at = "/recipes" }: OpenOptions): Promise<Page> => {
    const page = await open({ width, at: `/auth/sign-in?${new URLSearchParams({ returnTo: at })}` });
    await chooseAccount(page, account);
    await page.locator("h1").first().waitFor();
    return page;
  })
  .extend("newTab", () => openTab);
