import { z } from "zod";
import { LogLevel, parseSettings } from "./settings.ts";

const isLoopback = (url: string) => ["127.0.0.1", "[::1]", "localhost"].includes(new URL(url).hostname);

const flag = z
  .enum(["0", "1"])
  .default("0")
  .transform((value) => value === "1");

/** Every setting of the API process: read once, refused at once when wrong. README lists them. */
const Settings = z
  .object({
    NODE_ENV: z.enum(["development", "test", "production"]).default("production"),
    HOST: z.string().default("127.0.0.1"),
    PORT: z.coerce.number().int().min(0).max(65_535).default(4300),
    PUBLIC_URL: z.url().transform((url) => new URL(url).origin),
    DATABASE_URL: z.string().min(1).describe("PostgreSQL as role web"),
    DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(10),
    SESSION_SECRET: z.string().min(32, "needs 32 characters or more"),
    OIDC_ISSUER: z.url(),
    OIDC_CLIENT_ID: z.string().min(1),
    OIDC_CLIENT_SECRET: z.string().min(1),
    OIDC_PROVIDER_NAME: z.string().min(1).optional(),
    TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0),
    RATE_LIMIT_PER_MINUTE: z.coerce.number().int().min(1).default(600),
    WEB_DIR: z.string().default("dist/web"),
    DEMO: flag,
    LOG_LEVEL: LogLevel,
  })
  .check(
    // The process speaks plain HTTP, so https means a proxy; unless it is trusted no secure cookie is set and nobody can sign in.
    z.refine((settings) => settings.TRUST_PROXY > 0 || !settings.PUBLIC_URL.startsWith("https:"), {
      path: ["TRUST_PROXY"],
      error: "an https PUBLIC_URL needs the number of proxies in front, 1 or more",
    }),
    // OpenID Connect Discovery 1.0, section 3: an issuer is an https address. This keeps the stand-in out as well.
    z.refine((settings) => settings.NODE_ENV !== "production" || settings.OIDC_ISSUER.startsWith("https:"), {
      path: ["OIDC_ISSUER"],
      error: "must be https in production; the stand-in provider is for development and tests",
    }),
    z.refine(
      ({ NODE_ENV, PUBLIC_URL }) =>
        NODE_ENV !== "production" || PUBLIC_URL.startsWith("https:") || isLoopback(PUBLIC_URL),
      { path: ["PUBLIC_URL"], error: "must be https in production: over http the session cookie is anybody's to read" },
    ),
  );
export type Settings = z.infer<typeof Settings>;

export function readSettings(environment: NodeJS.ProcessEnv): Settings {
  return parseSettings(Settings, environment);
}
