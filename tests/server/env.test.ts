import { expect, test } from "vitest";
import { readSettings } from "#server/env.ts";

const whole = {
  PUBLIC_URL: "http://127.0.0.1:4300/",
  DATABASE_URL: "postgres://web@127.0.0.1/tempermark",
  SESSION_SECRET: "0123456789abcdef0123456789abcdef",
  OIDC_ISSUER: "https://sign-in.example",
  OIDC_CLIENT_ID: "tempermark",
  OIDC_CLIENT_SECRET: "secret",
};

test("takes production for granted and the origin of the public address", () => {
  expect(readSettings(whole)).toMatchObject({
    NODE_ENV: "production",
    PUBLIC_URL: "http://127.0.0.1:4300",
    DEMO: false,
  });
});

test("names every missing or wrong setting at once", () => {
  const { SESSION_SECRET: _, ...rest } = whole;
  expect(() => readSettings({ ...rest, PORT: "lots" })).toThrow(/PORT[\s\S]*SESSION_SECRET/);
});

test("refuses https without a trusted proxy: secure cookies would never be set", () => {
  const https = { ...whole, PUBLIC_URL: "https://tempermark.example" };
  expect(() => readSettings(https)).toThrow(/TRUST_PROXY/);
  expect(readSettings({ ...https, TRUST_PROXY: "1" }).TRUST_PROXY).toBe(1);
});
