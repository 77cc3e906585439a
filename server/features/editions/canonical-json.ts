/**
 * JSON with the keys of every object in order of their code units, as RFC 8785 sorts them: the same content always gives
 * the same text, so that a digest of it can be checked by anybody who has the content.
 */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner !== "object" || inner === null || Array.isArray(inner)) return inner;
    return Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}
