import { type NextFunction, type Request, type Response, Router } from "express";
import { Passport, type Strategy } from "passport";
import { type Db, isDatabaseUnavailable } from "#server/db/client.ts";
import { isProviderAway, providerDiscovery } from "./provider.ts";
import { findOrMakeUser, SignInRefused } from "./sign-in.service.ts";
import { makeStrategy, type SignedIn } from "./strategy.ts";

export interface SignInSettings {
  publicUrl: string;
  issuer: string;
  /** The name accounts are kept under: the issuer, unless its address may change as a stand-in's does. */
  providerName: string;
  clientId: string;
  clientSecret: string;
}

/** What the start page is told, in `?sign-in=`, of a sign-in that came to nothing. */
type Outcome = "unavailable" | "cancelled" | "expired" | "failed" | SignInRefused["reason"];

function giveUp(req: Request, res: Response, outcome: Outcome, error?: unknown): void {
  req.log.warn({ err: error, outcome }, "nobody signed in");
  res.redirect(`/?sign-in=${outcome}`);
}

function outcomeOf(error: unknown): Outcome {
  if (error instanceof SignInRefused) return error.reason;
  return isProviderAway(error) || isDatabaseUnavailable(error) ? "unavailable" : "failed";
}

/** The browser's way through sign-in, and what sign-out needs to end the provider's session too. */
export function signIn(db: Db, settings: SignInSettings) {
  const passport = new Passport();
  const discover = providerDiscovery(settings.issuer);
  // What signs in is what `findUser` gave: passport hands it on without its type.
  passport.serializeUser<string>((user, done) => done(null, (user as SignedIn).id));
  passport.deserializeUser<string>((id, done) => done(null, { id }));
  let ready = false;
  const prepare = async () => {
    const discovery = await discover();
    if (ready) return;
    const strategy = makeStrategy({
      discovery,
      clientId: settings.clientId,
      clientSecret: settings.clientSecret,
      callbackUrl: `${settings.publicUrl}/auth/callback`,
      findUser: (identity) => findOrMakeUser(db, settings.providerName, identity),
    });
    // Built on the parts the published types leave out, so they do not know it for a strategy.
    passport.use(strategy as unknown as Strategy);
    ready = true;
  };

  const run = async (req: Request, res: Response, next: NextFunction) => {
    res.set("Cache-Control", "no-store");
    try {
      await prepare();
    } catch (error) {
      return giveUp(req, res, outcomeOf(error), error);
    }
    passport.authenticate("oidc", (error: unknown, user: SignedIn | false) => {
      if (error) return giveUp(req, res, outcomeOf(error), error);
      if (!user) return giveUp(req, res, req.query.error ? "cancelled" : "expired");
      finishSignIn(req, res, user).catch(next);
    })(req, res, next);
  };

  const router = Router();
  router.get("/auth/sign-in", (req, res, next) => {
    // The strategy tells beginning from finishing by these alone.
    if (req.query.code !== undefined || req.query.error !== undefined) return giveUp(req, res, "failed");
    return run(req, res, next);
  });
  router.get("/auth/callback", (req, res, next) => {
    // A second tab that finishes after the first: already in, nothing to do.
    if (req.user) return res.redirect("/");
    if (!req.query.code && !req.query.error) return giveUp(req, res, "failed");
    return run(req, res, next);
  });

  const endSessionUrl = async (idToken: string | undefined): Promise<string> => {
    const home = `${settings.publicUrl}/`;
    const discovery = await discover().catch(() => undefined);
    if (!discovery?.end_session_endpoint || !idToken) return home;
    const url = new URL(discovery.end_session_endpoint);
    url.search = new URLSearchParams({ id_token_hint: idToken, post_logout_redirect_uri: home }).toString();
    return url.href;
  };
  return { passport, router, endSessionUrl };
}

/** passport regenerates the session as it signs in, so what must outlive that is set afterwards. */
async function finishSignIn(req: Request, res: Response, user: SignedIn): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    req.logIn(user, (error: unknown) => (error ? reject(error) : resolve()));
  });
  req.session.idToken = user.idToken;
  res.redirect(user.returnTo);
}
