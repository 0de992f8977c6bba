/**
 * JSON with the keys of every object in code-unit order and no white space, so that equal values have equal text
 * (as RFC 8785 asks; the numbers and strings of JSON.stringify are those of that standard).
 */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner !== 'object' || inner === null || Array.isArray(inner)) return inner;
    return Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}
