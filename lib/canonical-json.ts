/**
 * JSON with one spelling for one value, as RFC 8785 lays down: members sorted by their UTF-16 code units, no spaces, numbers and
 * strings as ECMAScript writes them. What is signed or sealed is written so. Throws for what JSON cannot hold (NaN, functions).
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean' || typeof value === 'string') return JSON.stringify(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError(`${value} has no JSON.`);
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  if (value instanceof Date) return JSON.stringify(value);
  if (typeof value !== 'object') throw new TypeError(`A ${typeof value} has no JSON.`);
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${members.map(([name, member]) => `${JSON.stringify(name)}:${canonicalJson(member)}`).join(',')}}`;
}
