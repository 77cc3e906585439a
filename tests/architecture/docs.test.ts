import { existsSync, readFileSync } from "node:fs";
import { expect, test } from "vitest";

const documents = ["README.md", "DEVELOPERS.md"];
const topFolders = /^(src|server|shared|tests|oidc-fake|drizzle|bench|\.ci)\//;

/**
 * Paths cited in code spans and links. Anything in a code span that begins with one of our top folders counts, as does
 * a link that leads out of the document; `<name>`, `*` and `…` stand for many files and are cut off before.
 */
function citedPaths(markdown: string): string[] {
  const spans = [...markdown.matchAll(/`([^`\n]+)`/g)]
    .map((match) => match[1]!)
    .filter((text) => topFolders.test(text));
  const links = [...markdown.matchAll(/\]\(([^)#\s]+)[^)]*\)/g)]
    .map((match) => match[1]!)
    .filter((target) => !/^[a-z]+:/.test(target));
  return [...spans.map((text) => text.split(" ")[0]!), ...links].map((text) => text.replace(/[^/]*[<*…].*$/, ""));
}

test("finds paths in code spans and links, and leaves other words alone", () => {
  const text =
    "See `server/app.ts`, [the drift](src/drift.md#top), `npm start`, <https://example.org>, `server/features/<name>/x.ts`.";
  expect(citedPaths(text)).toEqual(["server/app.ts", "server/features/", "src/drift.md"]);
});

test.each(documents)("every path cited in %s exists", (document) => {
  const cited = citedPaths(readFileSync(document, "utf8"));
  expect(cited.length, "a document that cites nothing is not a guide").toBeGreaterThan(0);
  expect(cited.filter((entry) => !existsSync(entry))).toEqual([]);
});

test.each(documents)("every npm script named in %s exists", (document) => {
  const { scripts } = JSON.parse(readFileSync("package.json", "utf8"));
  const named = [...readFileSync(document, "utf8").matchAll(/npm run ([\w:-]+)/g)].map((match) => match[1]!);
  expect(named.filter((name) => !(name in scripts))).toEqual([]);
});
