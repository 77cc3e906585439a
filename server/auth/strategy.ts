import type { Request } from "express";
import { createRemoteJWKSet, jwtVerify } from "jose";
import OpenIDConnectStrategy from "passport-openidconnect";
import { z } from "zod";
import { beginSignIn, challengeOf, type PendingSignIn, safeReturnTo, takePendingSignIn } from "./pending-sign-ins.ts";
import type { Discovery } from "./provider.ts";

/** What the provider vouches for: who somebody is, never what they may do here. */
export const Identity = z.object({
  sub: z.string().min(1).max(255),
  email: z.email().transform((email) => email.toLowerCase()),
  email_verified: z.boolean().default(false),
  name: z.string().trim().min(1).max(120).optional(),
});
export type Identity = z.infer<typeof Identity>;

/** What passport hands on after a sign-in. */
export interface SignedIn {
  id: string;
  idToken: string;
  returnTo: string;
}

type TokenDone = (error: unknown, ...tokens: unknown[]) => void;

interface TokenClient {
  getOAuthAccessToken(code: string, params: Record<string, string>, done: TokenDone): void;
}

/** Milliseconds. The library itself would wait for ever where a provider takes the question and never answers. */
const tokenPatience = 8000;

/** Calls back once: with the answer, or without one when it takes too long. */
function within(milliseconds: number, done: TokenDone): TokenDone {
  let isOpen = true;
  const settle: TokenDone = (...answer) => {
    clearTimeout(timer);
    if (isOpen) done(...answer);
    isOpen = false;
  };
  const late = () => settle(Object.assign(new Error("the sign-in provider did not answer"), { code: "ETIMEDOUT" }));
  const timer = setTimeout(late, milliseconds);
  return settle;
}

/** The parts of passport-openidconnect used here; its published types leave most of them out. */
interface StrategyBase {
  name: string;
  _oauth2: TokenClient;
  authenticate(req: Request, options?: object): void;
  authorizationParams(options: object): object;
}
const Base = OpenIDConnectStrategy as unknown as new (options: object, verify: unknown) => StrategyBase;

/** The sign-in each request belongs to: begun by it, or found again by its state. */
const signIns = new WeakMap<Request, PendingSignIn>();

/** passport-openidconnect's own store keeps one sign-in a session, so that two tabs break each other. */
const stateStore = {
  store(
    req: Request,
    _context: unknown,
    _state: unknown,
    _meta: unknown,
    done: (error: null, state?: string) => void,
  ): void {
    done(null, signIns.get(req)?.state);
  },
  verify(req: Request, state: unknown, done: (error: null, context: unknown, info?: unknown) => void): void {
    const pending = takePendingSignIn(req, String(state), Date.now());
    if (pending) signIns.set(req, pending);
    if (pending) done(null, { nonce: pending.nonce });
    else done(null, false, { message: "This sign-in has expired or was used before." });
  },
};

/** Adds PKCE (RFC 7636) and a nonce of our own. passport makes one instance a request, so `request` is that request. */
class PkceStrategy extends Base {
  override name = "oidc";
  private request!: Request;

  override authenticate(req: Request, options?: object): void {
    this.request = req;
    const client = this._oauth2;
    this._oauth2 = Object.assign(Object.create(client) as TokenClient, {
      getOAuthAccessToken: (code: string, params: Record<string, string>, done: TokenDone) => {
        const withVerifier = { ...params, code_verifier: signIns.get(req)?.verifier ?? "" };
        client.getOAuthAccessToken(code, withVerifier, within(tokenPatience, done));
      },
    });
    super.authenticate(req, options);
  }

  override authorizationParams(): object {
    const begun = beginSignIn(this.request, safeReturnTo(this.request.query.returnTo), Date.now());
    signIns.set(this.request, begun);
    return { nonce: begun.nonce, code_challenge: challengeOf(begun.verifier), code_challenge_method: "S256" };
  }
}

export interface StrategyOptions {
  discovery: Discovery;
  clientId: string;
  clientSecret: string;
  callbackUrl: string;
  /** Finds or makes the user behind an identity and returns the id. */
  findUser: (identity: Identity) => Promise<string>;
}

/** The strategy against one provider. The ID token's signature is checked here: passport-openidconnect does not. */
export function makeStrategy({ discovery, clientId, clientSecret, callbackUrl, findUser }: StrategyOptions) {
  const keys = createRemoteJWKSet(new URL(discovery.jwks_uri));
  const expected = { issuer: discovery.issuer, audience: clientId, algorithms: ["RS256", "PS256", "ES256", "EdDSA"] };
  type Done = (error: unknown, user?: SignedIn) => void;
  // passport-openidconnect reads the number of parameters: six of them bring the request and the raw ID token along.
  const verify = (req: Request, _issuer: string, _profile: unknown, _context: unknown, idToken: string, done: Done) => {
    jwtVerify(idToken, keys, expected)
      .then(({ payload }) => findUser(Identity.parse(payload)))
      .then((id) => done(null, { id, idToken, returnTo: signIns.get(req)?.returnTo ?? "/" }))
      .catch((error: unknown) => done(error));
  };
  return new PkceStrategy(
    {
      issuer: discovery.issuer,
      authorizationURL: discovery.authorization_endpoint,
      tokenURL: discovery.token_endpoint,
      userInfoURL: discovery.userinfo_endpoint,
      clientID: clientId,
      clientSecret,
      callbackURL: callbackUrl,
      scope: ["email", "profile"],
      store: stateStore,
      skipUserProfile: true,
      passReqToCallback: true,
    },
    verify,
  );
}
