/** A key nobody else will choose. `crypto.randomUUID` is missing where the site is served without TLS in a shop's own network. */
export function randomKey(): string {
  if (typeof crypto.randomUUID === "function") return crypto.randomUUID();
  return Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, "0")).join("");
}
