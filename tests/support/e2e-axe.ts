import axe, { type RunOptions } from "axe-core";
import type { Page } from "playwright-core";
import { expect } from "vitest";

/** In light everything is looked at; in dark what depends on colours, for nothing else differs. */
const runs: Record<"light" | "dark", RunOptions> = {
  light: {
    runOnly: { type: "tag", values: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"] },
  },
  dark: { runOnly: { type: "rule", values: ["color-contrast", "link-in-text-block"] } },
};

async function violations(page: Page, options: RunOptions): Promise<string[]> {
  // The page's own policy forbids a script element, so the source is evaluated.
  if (!(await page.evaluate(() => "axe" in window))) await page.evaluate(axe.source);
  const found = await page.evaluate(
    async (given) => (await (window as never as { axe: typeof axe }).axe.run(given)).violations,
    { ...options, resultTypes: ["violations" as const] },
  );
  return found.map(({ id, help, nodes }) =>
    [`${id}: ${help}`, ...nodes.map(({ html, failureSummary }) => `${html.slice(0, 200)} ${failureSummary}`)].join(
      "\n",
    ),
  );
}

/** The page has come to rest: nothing is loading. */
export async function settle(page: Page): Promise<void> {
  await page.locator("h1").first().waitFor();
  await expect.poll(() => page.locator(".skeleton").count(), { timeout: 20_000 }).toBe(0);
}

/** Colours glide to the other theme; half-way they belong to neither. */
async function repainted(page: Page): Promise<void> {
  await page.evaluate(async () => {
    const nextFrame = () => new Promise((resolve) => requestAnimationFrame(resolve));
    await nextFrame();
    await nextFrame();
    await Promise.allSettled(document.getAnimations().map((animation) => animation.finished));
  });
}

/** Everyone can use the page as it stands now: axe finds nothing in either theme, and nothing is cut off at the side. */
export async function expectUsable(page: Page): Promise<void> {
  await settle(page);
  for (const colorScheme of ["dark", "light"] as const) {
    await page.emulateMedia({ colorScheme });
    await repainted(page);
    expect(await violations(page, runs[colorScheme]), `${colorScheme}, ${page.url()}`).toEqual([]);
  }
  const { seen, needed } = await page.evaluate(() => ({
    seen: document.documentElement.clientWidth,
    needed: document.documentElement.scrollWidth,
  }));
  expect(needed, `width of ${page.url()}`).toBeLessThanOrEqual(seen);
}
