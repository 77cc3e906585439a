import { readFileSync, statSync, writeFileSync } from "node:fs";
import path from "node:path";
import { afterAll, beforeEach, expect, test } from "vitest";
import { loadSecrets } from "#server/launch/secrets.ts";
import { makeDataFolder, removeDataFolder } from "#tests/support/start-command.ts";

const folders: string[] = [];
let folder = "";
let file = "";
beforeEach(() => {
  folder = makeDataFolder();
  file = path.join(folder, "secrets.json");
  folders.push(folder);
});
afterAll(() => folders.forEach(removeDataFolder));

test("makes different secrets once and keeps them", () => {
  const first = loadSecrets(folder);
  expect(new Set(Object.values(first)).size).toBe(Object.keys(first).length);
  expect(loadSecrets(folder)).toEqual(first);
  expect(statSync(file).mode & 0o777).toBe(0o600);
});

test("two installations share no secret", () => {
  const one = Object.values(loadSecrets(folder));
  const other = Object.values(loadSecrets(folders[0]!));
  expect(one.filter((secret) => other.includes(secret))).toEqual([]);
});

test("adds one that an older file lacks and leaves the others", () => {
  const { editionMarks: _missing, ...older } = loadSecrets(folder);
  writeFileSync(file, JSON.stringify(older));
  const { editionMarks, ...kept } = loadSecrets(folder);
  expect(kept).toEqual(older);
  expect(JSON.parse(readFileSync(file, "utf8")).editionMarks).toBe(editionMarks);
});

test("refuses a file with a weak secret instead of replacing it", () => {
  writeFileSync(file, JSON.stringify({ ...loadSecrets(folder), web: "short" }));
  expect(() => loadSecrets(folder)).toThrow();
  expect(JSON.parse(readFileSync(file, "utf8")).web).toBe("short");
});
