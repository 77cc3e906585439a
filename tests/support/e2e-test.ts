import type { Browser, BrowserContext, Page } from "playwright-core";
import { test as base, expect, inject } from "vitest";
import type { demoAccounts } from "#oidc-fake/accounts.ts";
import { launchChromium } from "./chromium.ts";
import { errorsSince, logPlace } from "./e2e-logs.ts";
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

interface Fixtures {
  browser: Browser;
  /** Opens a browser of its own for somebody who has not signed in. */
  open: (options: OpenOptions) => Promise<Page>;
  /** The same, signed in by way of the provider's page. */
  signIn: (account: Account, options: OpenOptions) => Promise<Page>;
  /** Another tab of the same browser. */
  newTab: (page: Page, at: string) => Promise<Page>;
  /** Errors in the servers' logs that the test provokes; everything else fails it. */
  provoked: RegExp[];
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

/**
 * Tests of the whole product. Each fails by itself where a page logged, refused or broke anything unforeseen, or where a
 * server logged an error meanwhile.
 */
export const test = base.extend<Fixtures>({
  browser: [
    // biome-ignore lint/correctness/noEmptyPattern: vitest reads the fixtures asked for from the pattern
    async ({}, use) => {
      const browser = await launchChromium();
      await use(browser);
      await browser.close();
    },
    { scope: "file" },
  ],
  // biome-ignore lint/correctness/noEmptyPattern: as above
  provoked: async ({}, use) => use([]),
  open: async ({ browser, provoked }, use) => {
    const before = logPlace(product.folder);
    const contexts: BrowserContext[] = [];
    const watches: Watch[] = [];
    await use(async ({ width, at = "/" }) => {
      const context = await openContext(browser, width);
      contexts.push(context);
      context.on("page", (page) => watches.push(watchPage(page)));
      const page = await context.newPage();
      await page.goto(at);
      return page;
    });
    await Promise.all(contexts.map((context) => context.close()));
    expect(watches.flatMap(unexpectedOf)).toEqual([]);
    const errors = errorsSince(product.folder, before);
    expect(errors.filter((line) => !provoked.some((pattern) => pattern.test(line)))).toEqual([]);
  },
  signIn: async ({ open }, use) =>
    use(async (account, { width, at = "/recipes" }) => {
      const page = await open({ width, at: `/auth/sign-in?${new URLSearchParams({ returnTo: at })}` });
      await chooseAccount(page, account);
      await page.locator("h1").first().waitFor();
      return page;
    }),
  // biome-ignore lint/correctness/noEmptyPattern: as above
  newTab: async ({}, use) =>
    use(async (page, at) => {
      const tab = await page.context().newPage();
      await tab.goto(at);
      return tab;
    }),
});
