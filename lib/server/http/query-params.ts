import 'server-only';
import { HttpProblem } from './problem';

/**
 * The query string as at most one text a parameter.
 *
 * @param allowed the names this route knows.
 * @throws HttpProblem `param` for an unknown name (also `name[]`), `dup-param` for a name given twice.
 */
export function queryParams<Name extends string>(url: string, allowed: readonly Name[]): Partial<Record<Name, string>> {
  const found: Partial<Record<Name, string>> = {};
  for (const [key, value] of new URL(url).searchParams) {
    const name = allowed.find((candidate) => candidate === key);
    if (name === undefined) throw new HttpProblem('param');
    if (found[name] !== undefined) throw new HttpProblem('dup-param');
    found[name] = value;
  }
  return found;
}

/**
 * A whole number from a query parameter, brought into a range.
 *
 * @throws HttpProblem `limit` when the text is not a whole number.
 */
export function clampedInteger(
  text: string | undefined,
  range: { min: number; max: number; otherwise: number },
): number {
  if (text === undefined) return range.otherwise;
  if (!/^-?\d{1,15}$/.test(text)) throw new HttpProblem('limit');
  return Math.min(range.max, Math.max(range.min, Number(text)));
}
