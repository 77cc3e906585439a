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

test("production wants https: of the sign-in provider always, of itself wherever it is not on loopback", () => {
  const standIn = { ...whole, OIDC_ISSUER: "http://127.0.0.1:4310" };
  expect(() => readSettings(standIn)).toThrow(/OIDC_ISSUER/);
  expect(readSettings({ ...standIn, NODE_ENV: "development" }).OIDC_ISSUER).toBe("http://127.0.0.1:4310");
  expect(() => readSettings({ ...whole, PUBLIC_URL: "http://tempermark.example" })).toThrow(/PUBLIC_URL/);
});
