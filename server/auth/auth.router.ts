import { type Request, type Response, Router } from "express";
import { Passport, type Strategy } from "passport";
import type { Db } from "#server/db/client.ts";
import { ProblemError } from "../http/problem.ts";
import { providerDiscovery } from "./provider.ts";
import { findOrMakeUser } from "./sign-in.service.ts";
import { makeStrategy, type SignedIn } from "./strategy.ts";

export interface SignInSettings {
  publicUrl: string;
  issuer: string;
  /** The name accounts are kept under: the issuer, unless its address may change as a stand-in's does. */
  providerName: string;
  clientId: string;
  clientSecret: string;
}

/** The browser's way through sign-in, and what sign-out needs to end the provider's session too. */
export function signIn(db: Db, settings: SignInSettings) {
  const passport = new Passport();
  const discover = providerDiscovery(settings.issuer);
  passport.serializeUser<string>((user, done) => done(null, (user as SignedIn).id));
  passport.deserializeUser<string>((id, done) => done(null, { id } as Express.User));
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
    passport.use(strategy as unknown as Strategy);
    ready = true;
  };

  const router = Router();
  router.get("/auth/sign-in", async (req, res, next) => {
    try {
      await prepare();
    } catch (error) {
      if (error instanceof ProblemError) return res.redirect("/?sign-in=unavailable");
      throw error;
    }
    passport.authenticate("oidc")(req, res, next);
  });
  router.get("/auth/callback", async (req, res, next) => {
    // A second tab that finishes after the first: already in, nothing to do.
    if (req.user) return res.redirect("/");
    await prepare();
    passport.authenticate("oidc", (error: unknown, user: SignedIn | false) => {
      if (error || !user) {
        req.log.warn({ err: error ?? undefined }, "sign-in refused");
        return res.redirect(error ? "/?sign-in=failed" : "/?sign-in=cancelled");
      }
      finishSignIn(req, res, user).catch(next);
    })(req, res, next);
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
    req.logIn(user as unknown as Express.User, (error: unknown) => (error ? reject(error) : resolve()));
  });
  req.session.idToken = user.idToken;
  res.redirect(user.returnTo);
}
