import { PUSH_ANSWER } from './answer-shapes';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import type { HeldLease } from './lease';
import type { LocalOp } from './local-op';
import { markSuspect } from './mark-suspect';
import { pushRequest, takeBatch } from './push-batch';
import { type PushPace, faster, newPace, slower, struck } from './push-pace';
import { settleResults } from './settle-results';
import type { StoreMeta } from './store';

/** What sending one batch led to. */
interface Sent {
  pace: PushPace;
  settled: number;
  end: StepEnd;
}

/** Our office answered, but about something else than what was sent. */
const NOTHING_SETTLED: StepEnd = { kind: 'again', trouble: 'no-real-connection', afterMs: null };

/** Is the office well, apart from the operation it just failed over? An empty push tells. */
async function setAside(ports: DrainPorts, meta: StoreMeta, { key }: LocalOp): Promise<StepEnd> {
  const { verdict, now } = await askOffice(ports, pushRequest([], meta), PUSH_ANSWER);
  if (verdict.kind !== 'ok') return endOf(verdict, meta.epoch);
  await ports.store.transact([key], markSuspect(now));
  return null;
}

/** Narrows down which operation of a batch the office fails over. */
async function blame(
  ports: DrainPorts,
  batch: readonly LocalOp[],
  at: { meta: StoreMeta; pace: PushPace },
): Promise<Sent> {
  const [first] = batch;
  if (!first || batch.length > 1) return { pace: slower(at.pace, batch.length), settled: 0, end: null };
  const end = await setAside(ports, at.meta, first);
  return { pace: { ...at.pace, hunting: end !== null && at.pace.hunting }, settled: 0, end };
}

/** Sends one batch and settles what the office says about it. */
async function sendBatch(
  ports: DrainPorts,
  batch: readonly LocalOp[],
  at: { meta: StoreMeta; pace: PushPace; unsent: number },
): Promise<Sent> {
  const { meta, pace, unsent } = at;
  const { verdict, now, skewMs } = await askOffice(ports, { ...pushRequest(batch, meta), unsent }, PUSH_ANSWER);
  if (verdict.kind === 'ok') {
    const keys = batch.map((row) => row.key);
    const settled = await ports.store.transact(keys, settleResults({ answer: verdict.value, now, skewMs }));
    return { pace: faster(pace), settled, end: settled === 0 ? NOTHING_SETTLED : null };
  }
  if (verdict.kind === 'bad-batch') return blame(ports, batch, at);
  if (verdict.kind === 'server-error') {
    const hit = struck(pace, batch[0]?.key ?? '');
    if (hit.hunting) return blame(ports, batch, { meta, pace: hit });
    return { pace: hit, settled: 0, end: endOf(verdict, meta.epoch) };
  }
  const slow = verdict.kind === 'again' && verdict.slow;
  return { pace: slow ? slower(pace, batch.length) : pace, settled: 0, end: endOf(verdict, meta.epoch) };
}

/**
 * Sends the queue in order, batch after batch, until it is empty. Operations saved meanwhile go too.
 *
 * @param pace kept by the caller from pass to pass.
 */
export async function pushQueue(ports: DrainPorts, lease: HeldLease, pace: { value: PushPace }): Promise<StepEnd> {
  const { store, report } = ports;
  let gone = 0;
  while (!lease.lost()) {
    const meta = await store.readMeta();
    if (!meta) return { kind: 'cleared' };
    const batch = takeBatch(await store.queued(pace.value.limit));
    if (batch.length === 0) {
      pace.value = { ...newPace(), limit: pace.value.limit };
      return null;
    }
    const { queued, suspect } = await store.counts();
    report({ k: gone + batch.length, n: Math.max(gone + queued, gone + batch.length) });
    const sent = await sendBatch(ports, batch, { meta, pace: pace.value, unsent: queued + suspect });
    pace.value = sent.pace;
    gone += sent.settled;
    if (sent.end) return sent.end;
  }
  return { kind: 'elsewhere' };
}
