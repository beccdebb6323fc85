import 'server-only';
import { createHash } from 'node:crypto';
import type { ReadCell } from '@/lib/comb/final-cells';
import { canonicalJson } from '@/lib/protocol/canonical-json';

/**
 * The seal of a locked version: SHA-256 over the RFC 8785 canonical JSON of its cells in walk order, each with its
 * address, state and marks. Whoever has the cells can compute it again.
 */
export function cellsHash(cells: readonly ReadCell[]): Buffer {
  const said = cells.map(({ q, r, state, instar, nectar, unsure, reused, scrap, note }) => ({
    q,
    r,
    state,
    instar,
    nectar,
    unsure,
    reused,
    scrap,
    note,
  }));
  return createHash('sha256').update(canonicalJson(said), 'utf8').digest();
}
