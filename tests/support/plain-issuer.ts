import http from "node:http";
import type { AddressInfo } from "node:net";
import { exportJWK, generateKeyPair, type JWTPayload, SignJWT } from "jose";
import { clientId } from "./sign-in-site.ts";

/** An issuer that says whatever a test tells it to, right or wrong. */
export async function startPlainIssuer() {
  const { privateKey, publicKey } = await generateKeyPair("RS256", { extractable: true });
  const jwk = { ...(await exportJWK(publicKey)), kid: "one", alg: "RS256", use: "sig" };
  let idToken = "";
  const server = http.createServer((request, response) => {
    const answer = (body: object) => response.setHeader("content-type", "application/json").end(JSON.stringify(body));
    if (request.url === "/keys") return answer({ keys: [jwk] });
    if (request.url === "/token") return answer({ access_token: "a", token_type: "Bearer", id_token: idToken });
    answer({
      issuer,
      authorization_endpoint: `${issuer}/authorize`,
      token_endpoint: `${issuer}/token`,
      userinfo_endpoint: `${issuer}/me`,
      jwks_uri: `${issuer}/keys`,
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const issuer = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const now = () => Math.floor(Date.now() / 1000);
  return {
    issuer,
    /** A token that is right in all but what is given. */
    sign: (claims: JWTPayload, key: CryptoKey | Uint8Array = privateKey, alg = "RS256") =>
      new SignJWT({ iss: issuer, aud: clientId, iat: now(), exp: now() + 300, ...claims })
        .setProtectedHeader({ alg, kid: "one" })
        .sign(key),
    answerWith: (token: string) => {
      idToken = token;
    },
    stop: async () => {
      server.close();
      server.closeAllConnections();
    },
  };
}
