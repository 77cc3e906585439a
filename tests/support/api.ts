import { randomUUID } from "node:crypto";
import { sign } from "cookie-signature";
import type { Express } from "express";
import pino from "pino";
import supertest from "supertest";
import { createApp } from "#server/app.ts";
import { type Database, openDatabase } from "#server/db/client.ts";
import { readSettings } from "#server/env.ts";
import { createTestDatabase, type TestDatabase } from "./database.ts";

export const testOrigin = "http://127.0.0.1:4300";
const secret = "a-secret-for-tests-only-0123456789";

export interface TestApi {
  app: Express;
  database: TestDatabase;
  /** As the owner of the tables: for making rows, above row-level security. */
  owner: Database;
  /** Requests as one user (or a visitor), from the product's own origin. */
  as: (userId?: string) => Promise<TestClient>;
  close: () => Promise<void>;
}

type Verb = "get" | "post" | "put" | "patch" | "delete";
export type TestClient = Record<Verb, (path: string) => supertest.Test>;

/** The real application on a database of its own. Sign-in is a session row and its cookie; the browser tests sign in for real. */
export async function createTestApi(
  environment: Record<string, string> = {},
  logger: pino.Logger = pino({ level: "silent" }),
): Promise<TestApi> {
  const database = await createTestDatabase();
  const web = openDatabase(database.webUrl);
  const owner = openDatabase(database.ownerUrl);
  const settings = readSettings({
    NODE_ENV: "test",
    PUBLIC_URL: testOrigin,
    DATABASE_URL: database.webUrl,
    SESSION_SECRET: secret,
    OIDC_ISSUER: "http://127.0.0.1:9",
    OIDC_CLIENT_ID: "tempermark",
    OIDC_CLIENT_SECRET: "test",
    RATE_LIMIT_PER_MINUTE: "100000",
    LOG_LEVEL: "silent",
    ...environment,
  });
  const app = createApp(settings, web, logger);
  return {
    app,
    database,
    owner,
    as: async (userId) => {
      const cookie = userId ? await signInAs(owner, userId) : undefined;
      const request = (verb: Verb) => (path: string) => {
        const test = supertest(app)[verb](path).set("Origin", testOrigin);
        return cookie ? test.set("Cookie", cookie) : test;
      };
      return {
        get: request("get"),
        post: request("post"),
        put: request("put"),
        patch: request("patch"),
        delete: request("delete"),
      };
    },
    close: async () => {
      await web.close();
      await owner.close();
      await database.drop();
    },
  };
}

async function signInAs(owner: Database, userId: string): Promise<string> {
  const sid = randomUUID();
  const session = {
    cookie: {
      originalMaxAge: 3600_000,
      expires: new Date(Date.now() + 3600_000).toISOString(),
      httpOnly: true,
      path: "/",
    },
    passport: { user: userId },
  };
  await owner.pool.query("insert into sessions (sid, sess, expire) values ($1, $2, now() + interval '1 hour')", [
    sid,
    session,
  ]);
  return `tempermark.session=${encodeURIComponent(`s:${sign(sid, secret)}`)}`;
}
