import { z } from "zod";
import { ProblemError } from "../http/problem.ts";

const Discovery = z.object({
  issuer: z.string(),
  authorization_endpoint: z.url(),
  token_endpoint: z.url(),
  userinfo_endpoint: z.url(),
  jwks_uri: z.url(),
  end_session_endpoint: z.url().optional(),
});
export type Discovery = z.infer<typeof Discovery>;

/**
 * Asks the issuer for its endpoints (OpenID Connect Discovery 1.0) when they are first needed, and keeps the answer.
 * A provider that is down does not keep the product from starting; it is asked again at the next sign-in.
 */
export function providerDiscovery(issuer: string): () => Promise<Discovery> {
  let known: Discovery | undefined;
  return async () => {
    if (known) return known;
    try {
      const url = `${issuer.replace(/\/$/, "")}/.well-known/openid-configuration`;
      const answer = await fetch(url, { signal: AbortSignal.timeout(4000) });
      const found = Discovery.parse(await answer.json());
      if (found.issuer !== issuer) throw new Error("The provider names another issuer");
      known = found;
      return known;
    } catch {
      throw new ProblemError("sign-in-unavailable", {
        detail: "Sign-in does not work right now. Try again in a minute.",
      });
    }
  };
}

/** Whether a sign-in broke off because the provider did not answer, in whichever library's words. */
export function isProviderAway(error: unknown): boolean {
  if (error instanceof ProblemError) return error.problem === "sign-in-unavailable";
  if (typeof error !== "object" || error === null) return false;
  const { code, statusCode, cause, oauthError } = error as Record<string, unknown>;
  if (typeof statusCode === "number") return statusCode >= 500;
  const network = /^(E(CONN|TIMEDOUT|PIPE|HOSTUNREACH|NETUNREACH|NOTFOUND|AI_AGAIN)|UND_ERR_|ERR_JWKS_TIMEOUT)/;
  if (typeof code === "string" && network.test(code)) return true;
  return isProviderAway(oauthError ?? cause);
}
