import type { LocalOp } from './local-op';
import { officeKey } from './local-op';
import type { Standing } from './nest-view';

/** How far an operation has come, for a person to read. */
export function standingOf({ state, outcome }: LocalOp): Standing {
  if (state === 'queued' || state === 'suspect') return 'waiting';
  const refused = state === 'refused' || outcome === 'quarantined' || outcome === 'conflict';
  return refused ? 'not-accepted' : 'at-office';
}

/** The least advanced standing of several operations. */
export function worstStanding(rows: readonly LocalOp[]): Standing {
  const standings = new Set(rows.map(standingOf));
  if (standings.has('not-accepted')) return 'not-accepted';
  return standings.has('waiting') ? 'waiting' : 'at-office';
}

/** One row an operation id: where the office has something else under an id of ours, its version is shown. */
export function distinctOps(rows: readonly LocalOp[]): LocalOp[] {
  const keys = new Set(rows.map((row) => row.key));
  return rows.filter((row) => !keys.has(officeKey(row.key)));
}
