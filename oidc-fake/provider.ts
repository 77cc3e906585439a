import { randomBytes } from "node:crypto";
import { exportJWK, generateKeyPair, type JWK } from "jose";
import Provider, { type Configuration, interactionPolicy } from "oidc-provider";
import type { DemoAccount } from "./accounts.ts";
import { memoryAdapters } from "./memory-adapter.ts";
import { problemPage, signedOutPage, signOutPage } from "./page.ts";

export interface Client {
  clientId: string;
  clientSecret: string;
  redirectUris: string[];
  postLogoutUris: string[];
}

export async function generateSigningKey(): Promise<JWK> {
  const { privateKey } = await generateKeyPair("RS256", { extractable: true });
  return { ...(await exportJWK(privateKey)), kid: randomBytes(8).toString("hex"), use: "sig", alg: "RS256" };
}

/** The one client is the application itself, so there is nothing to consent to. */
const loadExistingGrant: Configuration["loadExistingGrant"] = async (ctx) => {
  const { client, session, provider, result } = ctx.oidc;
  if (!client || !session?.accountId) return undefined;
  const known = result?.consent?.grantId ?? session.grantIdFor(client.clientId);
  if (known) return provider.Grant.find(known);
  const grant = new provider.Grant({ clientId: client.clientId, accountId: session.accountId });
  grant.addOIDCScope("openid email profile");
  await grant.save();
  return grant;
};

/** Whoever tries the demonstration changes between people all the time: ask at every sign-in who it is to be. */
function alwaysAskWho(): interactionPolicy.DefaultPolicy {
  const policy = interactionPolicy.base();
  const { REQUEST_PROMPT, NO_NEED_TO_PROMPT } = interactionPolicy.Check;
  policy
    .get("login")
    ?.checks.add(
      new interactionPolicy.Check("person_chosen_each_time", "the person is chosen at each sign-in", (ctx) =>
        ctx.oidc.result?.login ? NO_NEED_TO_PROMPT : REQUEST_PROMPT,
      ),
    );
  return policy;
}

const features: Configuration["features"] = {
  devInteractions: { enabled: false },
  rpInitiatedLogout: {
    enabled: true,
    logoutSource: (ctx, form) => {
      ctx.body = signOutPage(form);
    },
    postLogoutSuccessSource: (ctx) => {
      ctx.body = signedOutPage();
    },
  },
};

function findAccount(accounts: readonly DemoAccount[]): NonNullable<Configuration["findAccount"]> {
  return (_ctx, sub) => {
    const account = accounts.find((known) => known.sub === sub);
    if (!account) return undefined;
    const { name, email } = account;
    return { accountId: sub, claims: () => ({ sub, name, email, email_verified: true }) };
  };
}

export function createProvider(issuer: string, client: Client, accounts: readonly DemoAccount[], key: JWK): Provider {
  return new Provider(issuer, {
    adapter: memoryAdapters(),
    clients: [
      {
        client_id: client.clientId,
        client_secret: client.clientSecret,
        redirect_uris: client.redirectUris,
        post_logout_redirect_uris: client.postLogoutUris,
        grant_types: ["authorization_code"],
        response_types: ["code"],
        token_endpoint_auth_method: "client_secret_post", // the only way passport-openidconnect knows
      },
    ],
    // jose and oidc-provider describe the same JSON with different types
    jwks: { keys: [key as never] },
    // Browsers do not keep cookies apart by port: the names must differ from the application's.
    cookies: {
      keys: [randomBytes(32).toString("hex")],
      names: { session: "stand_in_session", interaction: "stand_in_interaction", resume: "stand_in_resume" },
    },
    pkce: { required: () => true },
    conformIdTokenClaims: false, // e-mail and name in the id_token, so that the application need not ask again
    claims: { openid: ["sub"], email: ["email", "email_verified"], profile: ["name"] },
    features,
    findAccount: findAccount(accounts),
    loadExistingGrant,
    interactions: { policy: alwaysAskWho(), url: (_ctx, interaction) => `/sign-in/${interaction.uid}` },
    renderError: (ctx, out) => {
      ctx.type = "html";
      ctx.body = problemPage("Sign-in did not work", [out.error, out.error_description].filter(Boolean).join(": "));
    },
    // seconds
    ttl: { Session: 28_800, Interaction: 600, Grant: 28_800, AuthorizationCode: 60, AccessToken: 600, IdToken: 3600 },
  });
}
