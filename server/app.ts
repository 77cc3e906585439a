import compression from "compression";
import express, { type Express } from "express";
import type pino from "pino";
import { signIn } from "./auth/auth.router.ts";
import type { Database } from "./db/client.ts";
import { checkDatabase } from "./db/health.ts";
import type { Settings } from "./env.ts";
import { accountsRouter } from "./features/accounts/accounts.router.ts";
import { applicationsRouter } from "./features/applications/applications.router.ts";
import { editionsRouter } from "./features/editions/editions.router.ts";
import { machinesRouter } from "./features/machines/machines.router.ts";
import { membersRouter } from "./features/members/members.router.ts";
import { peersRouter } from "./features/peers/peers.router.ts";
import { recipesRouter } from "./features/recipes/recipes.router.ts";
import { sharingRouter } from "./features/sharing/sharing.router.ts";
import { startingRecipesRouter } from "./features/starting-recipes/starting-recipes.router.ts";
import { testCutsRouter } from "./features/test-cuts/test-cuts.router.ts";
import { openApiDocument } from "./http/openapi.ts";
import { requireOwnOrigin } from "./http/origin.ts";
import { ProblemError, sendProblem } from "./http/problem.ts";
import { limitRate } from "./http/rate-limit.ts";
import { requestLog } from "./http/request-log.ts";
import { securityHeaders } from "./http/security-headers.ts";
import { sessionHandler } from "./http/session.ts";
import { webFiles } from "./http/web-files.ts";

/** The whole API and the built application as one handler. Holds no state of its own: run as many as wanted. */
export function createApp(settings: Settings, { db, pool }: Database, logger: pino.Logger): Express {
  const https = settings.PUBLIC_URL.startsWith("https:");
  const limit = (name: string, perMinute: number) => limitRate(db, settings.SESSION_SECRET, name, perMinute);
  const auth = signIn(db, {
    publicUrl: settings.PUBLIC_URL,
    issuer: settings.OIDC_ISSUER,
    providerName: settings.OIDC_PROVIDER_NAME ?? settings.OIDC_ISSUER,
    clientId: settings.OIDC_CLIENT_ID,
    clientSecret: settings.OIDC_CLIENT_SECRET,
  });

  const app = express();
  app.set("trust proxy", settings.TRUST_PROXY).set("etag", false).disable("x-powered-by");
  app.use(requestLog(logger), securityHeaders(https), compression());
  app.get("/healthz", (_req, res) => void res.json({ status: "up" }));
  app.get("/readyz", async (_req, res) => {
    await checkDatabase(db);
    res.json({ status: "ready" });
  });

  const document = openApiDocument();
  app.get("/api/openapi.json", (_req, res) => void res.json(document));

  app.use(["/api", "/auth"], sessionHandler(pool, settings.SESSION_SECRET, https), auth.passport.session());
  app.use("/auth", limit("auth", Math.min(60, settings.RATE_LIMIT_PER_MINUTE)));
  app.use("/api", limit("api", settings.RATE_LIMIT_PER_MINUTE), requireOwnOrigin(settings.PUBLIC_URL));
  app.use("/api", express.json({ limit: "256kb" }));
  app.post("/api/applications", limit("applications", Math.min(10, settings.RATE_LIMIT_PER_MINUTE)));
  app.use(
    auth.router,
    accountsRouter(db, { demo: settings.DEMO, endSessionUrl: auth.endSessionUrl }),
    applicationsRouter(db),
    membersRouter(db),
    machinesRouter(db),
    recipesRouter(db),
    testCutsRouter(db),
    sharingRouter(db),
    editionsRouter(db),
    peersRouter(db),
    startingRecipesRouter(db),
  );
  app.all(["/api/{*path}", "/auth/{*path}"], () => {
    throw new ProblemError("not-found");
  });
  app.use(webFiles(settings.WEB_DIR));
  app.use(() => {
    throw new ProblemError("not-found");
  });
  app.use(sendProblem);
  return app;
}
