import { MAX_HAVE_IDS } from '@/lib/protocol/limits';
import { HAVE_ANSWER } from './answer-shapes';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import type { HeldLease } from './lease';
import type { LocalOp } from './local-op';
import { type NetworkRequest, REQUEST_TIMEOUT_MS } from './network';
import type { Change, Snapshot, StoreMeta } from './store';

/** One page of the question, and what the restored office has of it. */
interface Offer {
  epoch: number;
  /** Where the page began. */
  after: string;
  /** Where the next one begins; null after the last. */
  next: string | null;
  have: ReadonlySet<string>;
}

/** The office knows this one by its place in the log. What it had set aside is sent again: ids do not prove bodies. */
function isBack({ op, outcome }: LocalOp, have: ReadonlySet<string>): boolean {
  return (outcome === 'applied' || outcome === 'duplicate') && have.has(op.opId);
}

/** Puts what the office has lost back into the queue and remembers how far the question has come. */
export function requeueLost({ epoch, after, next, have }: Offer) {
  return ({ meta, ops }: Snapshot): Change<boolean> => {
    if (!meta || meta.epoch !== epoch || meta.reofferAfter !== after) return { result: false };
    const lost = [...ops.values()].filter((row) => row.state === 'held' && !isBack(row, have));
    return {
      result: true,
      ops: lost.map((row) => ({ ...row, state: 'queued', outcome: null, code: null, seq: 0, epoch: 0 })),
      meta: { ...meta, reofferAfter: next },
    };
  };
}

function haveRequest(page: readonly LocalOp[], { deviceId }: StoreMeta): NetworkRequest {
  const body = JSON.stringify({ opIds: page.map((row) => row.op.opId) });
  return { method: 'POST', path: '/api/sync/v1/have', body, deviceId, timeoutMs: REQUEST_TIMEOUT_MS };
}

/** Asks about one page of held operations. */
async function offerPage(ports: DrainPorts, meta: StoreMeta, after: string): Promise<StepEnd> {
  const page = await ports.store.heldAfter(after, MAX_HAVE_IDS);
  const keys = page.map((row) => row.key);
  const offer = { epoch: meta.epoch, after, next: page.length < MAX_HAVE_IDS ? null : (keys.at(-1) ?? null) };
  if (page.length === 0) {
    await ports.store.transact([], requeueLost({ ...offer, have: new Set() }));
    return null;
  }
  const { verdict } = await askOffice(ports, haveRequest(page, meta), HAVE_ANSWER);
  if (verdict.kind !== 'ok') return endOf(verdict, meta.epoch);
  if (verdict.value.epoch !== meta.epoch) return { kind: 'epoch', from: meta.epoch, epoch: verdict.value.epoch };
  await ports.store.transact(keys, requeueLost({ ...offer, have: new Set(verdict.value.have) }));
  return null;
}

/** After a restore of the office: finds out what it has lost of ours, and queues that again. */
export async function reoffer(ports: DrainPorts, lease: HeldLease): Promise<StepEnd> {
  while (!lease.lost()) {
    const meta = await ports.store.readMeta();
    if (!meta) return { kind: 'cleared' };
    if (meta.reofferAfter === null) return null;
    const end = await offerPage(ports, meta, meta.reofferAfter);
    if (end) return end;
  }
  return { kind: 'elsewhere' };
}
