import 'server-only';
import { idKey } from './id-key';
import type { ReadingRow } from './reading-rows';

const KIND_ORDER: readonly string[] = ['final', 'field', 'second'];

/** Is the final reading locked at the version it is at? */
export function isLocked({ version, locked_version }: Pick<ReadingRow, 'version' | 'locked_version'>): boolean {
  return version !== null && locked_version === version;
}

/** Is this the reading somebody chose of several, or the final one made from it? */
function isChosen({ id, based_on }: ReadingRow, chosen: ReadonlySet<string>): boolean {
  return chosen.has(idKey(based_on ?? id));
}

/** Compares two readings of one visit so that the better one comes first. */
function byStanding(a: ReadingRow, b: ReadingRow, chosen: ReadonlySet<string>): number {
  return (
    KIND_ORDER.indexOf(a.kind) - KIND_ORDER.indexOf(b.kind) ||
    Number(isChosen(b, chosen)) - Number(isChosen(a, chosen)) ||
    Number(b.locked_version !== null) - Number(a.locked_version !== null) ||
    Number(b.submitted_at !== null) - Number(a.submitted_at !== null) ||
    b.opened_at.getTime() - a.opened_at.getTime() ||
    Buffer.compare(b.id, a.id)
  );
}

/**
 * The reading that speaks for a visit: the final one, else what was read at the nest, else the second reading; of
 * several the one chosen, else the locked, then a submitted, then the latest one.
 *
 * @param chosen the readings (keys of `idKey`) that somebody chose where a visit has several.
 */
export function censusOf(readings: readonly ReadingRow[], chosen: ReadonlySet<string> = new Set()): ReadingRow | null {
  return [...readings].sort((a, b) => byStanding(a, b, chosen))[0] ?? null;
}
