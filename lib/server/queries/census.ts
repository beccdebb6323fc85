import 'server-only';
import type { ReadingRow } from './reading-rows';

const KIND_ORDER: readonly string[] = ['final', 'field', 'second'];

/** Is the final reading locked at the version it is at? */
export function isLocked({ version, locked_version }: Pick<ReadingRow, 'version' | 'locked_version'>): boolean {
  return version !== null && locked_version === version;
}

/** Compares two readings of one visit so that the better one comes first. */
function byStanding(a: ReadingRow, b: ReadingRow): number {
  return (
    KIND_ORDER.indexOf(a.kind) - KIND_ORDER.indexOf(b.kind) ||
    Number(b.locked_version !== null) - Number(a.locked_version !== null) ||
    Number(b.submitted_at !== null) - Number(a.submitted_at !== null) ||
    b.opened_at.getTime() - a.opened_at.getTime() ||
    Buffer.compare(b.id, a.id)
  );
}

/**
 * The reading that speaks for a visit: the final one, else what was read at the nest, else the second reading; of
 * several the locked, then a submitted, then the latest one.
 */
export function censusOf(readings: readonly ReadingRow[]): ReadingRow | null {
  return [...readings].sort(byStanding)[0] ?? null;
}
