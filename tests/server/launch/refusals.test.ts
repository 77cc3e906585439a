import { readdirSync } from "node:fs";
import { afterAll, expect, test } from "vitest";
import { startOidcFake } from "#oidc-fake/server.ts";
import { makeDataFolder, removeDataFolder, runStart } from "#tests/support/start-command.ts";

const folder = makeDataFolder();
afterAll(() => removeDataFolder(folder));

test("the start command refuses production before it touches anything", async () => {
  const run = runStart(["--data", folder], { NODE_ENV: "production" });
  expect(await run.exit).toBe(1);
  expect(run.output()).toContain("refuses NODE_ENV=production");
  expect(readdirSync(folder)).toEqual([]);
});

test("the sign-in stand-in refuses production", async () => {
  const before = process.env.NODE_ENV;
  process.env.NODE_ENV = "production";
  const attempt = startOidcFake({ port: 0, clientId: "a", clientSecret: "b", redirectUris: [], postLogoutUris: [] });
  await expect(attempt).rejects.toThrow("never runs in production");
  process.env.NODE_ENV = before;
});

test.each([
  [["--port", "web"], '--port wants a number from 0 to 65535, not "web"'],
  [["--port", "65536"], '--port wants a number from 0 to 65535, not "65536"'],
  [["--colour"], "Unknown option '--colour'"],
])("refuses %j in words", async (args, words) => {
  const run = runStart([...args, "--data", folder]);
  expect(await run.exit).toBe(1);
  expect(run.output()).toContain(words);
  expect(run.output()).not.toContain("    at "); // no stack: it is the person's mistake, not ours
});

test("--help names every option and starts nothing", async () => {
  const run = runStart(["--help", "--data", folder]);
  expect(await run.exit).toBe(0);
  for (const option of ["--port", "--data", "--no-seed"]) expect(run.output()).toContain(option);
  expect(readdirSync(folder)).toEqual([]);
});
