/**
 * JSON with object keys in order of their UTF-16 code units and no white space, as RFC 8785 writes it: equal values give
 * equal text wherever they were stored meanwhile. Numbers and strings are JavaScript's own, which is what the RFC asks.
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  if (typeof value === 'number' && !Number.isFinite(value)) throw new Error(`canonical JSON has no ${String(value)}`);
  if (typeof value !== 'object' || value === null) return JSON.stringify(value ?? null);
  const fields = Object.entries(value).filter(([, inner]) => inner !== undefined);
  fields.sort(([left], [right]) => (left < right ? -1 : 1));
  return `{${fields.map(([key, inner]) => `${JSON.stringify(key)}:${canonicalJson(inner)}`).join(',')}}`;
}
