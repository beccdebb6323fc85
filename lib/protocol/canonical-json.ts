/** A value that JSON can hold. */
export type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/**
 * Canonical JSON after RFC 8785 (JCS): no white space, members sorted by UTF-16 code units, numbers in the
 * shortest form that reads back (ECMAScript `Number::toString`), −0 written as 0.
 *
 * @throws RangeError for a number that JSON cannot hold (NaN, Infinity).
 */
export function canonicalJson(value: Json): string {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError('JSON holds finite numbers only');
    return JSON.stringify(value === 0 ? 0 : value);
  }
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  const members = Object.keys(value)
    .sort()
    .map((key) => `${JSON.stringify(key)}:${canonicalJson(value[key] ?? null)}`);
  return `{${members.join(',')}}`;
}
