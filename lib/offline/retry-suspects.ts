import { PUSH_ANSWER } from './answer-shapes';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import type { HeldLease } from './lease';
import type { LocalOp } from './local-op';
import { markSuspect } from './mark-suspect';
import { pushRequest } from './push-batch';
import { settleResults } from './settle-results';
import type { StoreMeta } from './store';

/** How long an operation that the office fails over is left alone. */
export const SUSPECT_RETRY_MS = 24 * 3_600_000;

/** Most suspects tried in one pass. */
const PER_PASS = 20;

function isDue({ triedAt }: LocalOp, now: number): boolean {
  // A time ahead of the clock comes from a clock that was set back since.
  return triedAt === null || now - triedAt >= SUSPECT_RETRY_MS || triedAt > now;
}

/** Sends one suspect by itself. */
async function retryOne(ports: DrainPorts, meta: StoreMeta, row: LocalOp): Promise<StepEnd> {
  const { verdict, now, skewMs } = await askOffice(ports, pushRequest([row], meta), PUSH_ANSWER);
  if (verdict.kind === 'ok') {
    await ports.store.transact([row.key], settleResults({ answer: verdict.value, now, skewMs }));
    return null;
  }
  if (verdict.kind !== 'server-error' && verdict.kind !== 'bad-batch') return endOf(verdict, meta.epoch);
  await ports.store.transact([row.key], markSuspect(now));
  return null;
}

/**
 * Tries the suspects again that are due, each by itself, after everything else was sent.
 *
 * @param all true when the person asked for it: due or not.
 */
export async function retrySuspects(ports: DrainPorts, lease: HeldLease, all: boolean): Promise<StepEnd> {
  const suspects = await ports.store.inState('suspect', PER_PASS);
  for (const row of suspects) {
    if (!all && !isDue(row, ports.clock.now())) continue;
    const meta = await ports.store.readMeta();
    if (!meta) return { kind: 'cleared' };
    if (lease.lost()) return { kind: 'elsewhere' };
    const end = await retryOne(ports, meta, row);
    if (end) return end;
  }
  return null;
}
