import { v7 } from 'uuid';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { type VisitIds, freshIds, markOp } from './first-visit';
import type { WireClient } from './wire-client';
import { wireOp } from './wire-op';

/** One visit with a reading: when it began, and what the cells of the walk held. */
export interface ReadVisit {
  startedAt: string;
  states: readonly CellState[];
  /** Not handed in yet. */
  open?: boolean;
}

const AT_ONCE = 80;

/** Puts a nest that was read at several visits into the office; the ids are those of the last visit. */
export async function pushVisitedNest(
  client: WireClient,
  code: string,
  visits: readonly ReadVisit[],
): Promise<VisitIds> {
  let ids = freshIds();
  const { nest } = ids;
  await client.push([
    wireOp({ kind: 'nest.open', nest, body: { code, name: `${code} roof`, taxon: 'Polistes fuscatus' } }),
  ]);
  for (const { startedAt, states, open = false } of visits) {
    ids = { nest, visit: v7(), reading: v7() };
    await client.push([
      wireOp({ kind: 'visit.open', nest, visit: ids.visit, body: { purpose: 'check', startedAt } }),
      wireOp({ kind: 'reading.open', ...ids, body: { kind: 'field', source: 'phone' } }),
    ]);
    const marks = spiral(states.length).map((cell, index) =>
      markOp(ids, { ...cell, state: states[index] ?? 'unread' }),
    );
    for (let from = 0; from < marks.length; from += AT_ONCE) await client.push(marks.slice(from, from + AT_ONCE));
    if (!open) await client.push([wireOp({ kind: 'reading.submit', ...ids, body: {} })]);
  }
  return ids;
}
