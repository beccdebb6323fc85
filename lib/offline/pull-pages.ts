import { MAX_PULL_ROWS } from '@/lib/protocol/limits';
import { formatCursor } from '@/lib/protocol/pull';
import { PULL_ANSWER } from './answer-shapes';
import { applyPage } from './apply-page';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import { noteHeld } from './held-visits';
import type { HeldLease } from './lease';
import { type NetworkRequest, REQUEST_TIMEOUT_MS } from './network';
import type { Change, Snapshot, StoreMeta } from './store';

/** Starts the log from its beginning; the queue is not touched. */
function fromTheStart(epoch: number) {
  return ({ meta }: Snapshot): Change<void> => ({
    result: undefined,
    meta: meta?.epoch === epoch ? { ...meta, cursor: 0 } : undefined,
  });
}

function pullRequest({ epoch, cursor, deviceId }: StoreMeta): NetworkRequest {
  const query = `cursor=${formatCursor(epoch, cursor)}&limit=${MAX_PULL_ROWS}`;
  return { method: 'GET', path: `/api/sync/v1/pull?${query}`, deviceId, timeoutMs: REQUEST_TIMEOUT_MS };
}

/** Asks for one page and takes it in. `more` says whether another follows. */
async function pullPage(ports: DrainPorts, meta: StoreMeta): Promise<{ end: StepEnd; more: boolean }> {
  const { queued, suspect } = await ports.store.counts();
  const request = { ...pullRequest(meta), unsent: queued + suspect };
  const { verdict, now, skewMs } = await askOffice(ports, request, PULL_ANSWER);
  if (verdict.kind === 'restart') {
    await ports.store.transact([], fromTheStart(meta.epoch));
    return { end: null, more: meta.cursor > 0 };
  }
  if (verdict.kind !== 'ok') return { end: endOf(verdict, meta.epoch), more: false };
  const answer = verdict.value;
  const page = { start: { epoch: meta.epoch, cursor: meta.cursor }, answer, now, skewMs };
  const keys = answer.rows.map((row) => row.opId);
  if (await ports.store.transact(keys, applyPage(page))) {
    const goesBack = await ports.store.transact([], noteHeld(answer));
    return { end: null, more: answer.more || goesBack };
  }
  return { end: { kind: 'again', trouble: 'no-real-connection', afterMs: null }, more: false };
}

/** Brings everything the office has to this phone, page by page. */
export async function pullPages(ports: DrainPorts, lease: HeldLease): Promise<StepEnd> {
  while (!lease.lost()) {
    const meta = await ports.store.readMeta();
    if (!meta) return { kind: 'cleared' };
    const { end, more } = await pullPage(ports, meta);
    if (end || !more) return end;
  }
  return { kind: 'elsewhere' };
}
