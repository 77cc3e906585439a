import type { Page, Request } from "playwright-core";

/** What went wrong in a page that nobody at the screen may have seen. */
export interface Watch {
  /** One line each: "409 PUT /api/recipes/…", "console error: …". */
  problems: string[];
  expected: RegExp[];
}

const watches = new WeakMap<Page, Watch>();

const shortOf = (url: string) => url.replace(/^https?:\/\/[^/]+/, "");
const lineOf = (request: Request) => `${request.method()} ${shortOf(request.url())}`;

/** Chromium repeats every refused request on its console; the request itself says more. */
const repeatsRequest = (text: string) => text.startsWith("Failed to load resource:");

/** The browser gives up requests of pages that are left; so do pages with requests they need no more. */
const givenUp = (failure: string) => failure === "net::ERR_ABORTED";

export function watchPage(page: Page): Watch {
  const watch: Watch = { problems: [], expected: [] };
  watches.set(page, watch);
  const note = (line: string) => void watch.problems.push(line);
  page.on("console", (message) => {
    const noisy = message.type() === "error" || message.type() === "warning";
    if (noisy && !repeatsRequest(message.text())) note(`console ${message.type()}: ${message.text()}`);
  });
  page.on("pageerror", (error) => note(`page error: ${error.stack ?? error.message}`));
  page.on("requestfailed", (request) => {
    const failure = request.failure()?.errorText ?? "failed";
    if (!givenUp(failure)) note(`${failure} ${lineOf(request)}`);
  });
  page.on("response", (response) => {
    if (response.status() >= 400) note(`${response.status()} ${lineOf(response.request())}`);
  });
  return watch;
}

/** Says beforehand what a test is about to provoke. It must then happen. */
export function expectProblem(page: Page, ...patterns: RegExp[]): void {
  watches.get(page)?.expected.push(...patterns);
}

/** A page that is about to show a refusal in place of itself: React and its router also say so on the console. */
export function expectRefusal(page: Page, title: string, ...requests: RegExp[]): void {
  expectProblem(page, ...requests, new RegExp(`^console error: .*ApiProblem: ${title}`));
}

/** Problems nobody expected, and expected ones that did not come. */
export function unexpectedOf({ problems, expected }: Watch): string[] {
  const missing = expected.filter((pattern) => !problems.some((line) => pattern.test(line)));
  return [
    ...problems.filter((line) => !expected.some((pattern) => pattern.test(line))),
    ...missing.map((pattern) => `did not happen: ${pattern}`),
  ];
}
