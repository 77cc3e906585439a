import { createHmac } from "node:crypto";
import type { Digest } from "#shared/disclosure/ledger.ts";

function keyed(key: string, text: string): string {
  return createHmac("sha256", key).update(text).digest("base64url").slice(0, 16); // 96 bits: no two alike in any network
}

/** Marks of what machines gave. The key is kept outside the database, so that a copy of it gives no withdrawn value back. */
export function marksBy(key: string): Digest {
  return (text) => keyed(key, text);
}

/** Tells whether two editions were built with one key, without telling the key. */
export function fingerprintOf(key: string): string {
  return keyed(key, "fingerprint of the key");
}
