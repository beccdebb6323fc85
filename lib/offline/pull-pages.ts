import { formatHlc, parseHlc, receiveHlc } from '@/lib/kit/hlc';
import { MAX_PULL_ROWS } from '@/lib/protocol/limits';
import { type PullRow, formatCursor, parseCursor } from '@/lib/protocol/pull';
import { PULL_ANSWER, type PullAnswer } from './answer-shapes';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import type { HeldLease } from './lease';
import { type LocalOp, officeKey } from './local-op';
import { type NetworkRequest, REQUEST_TIMEOUT_MS } from './network';
import type { Change, Snapshot, StoreMeta } from './store';

/** A page, and the cursor it was asked for with. */
export interface Page {
  start: { epoch: number; cursor: number };
  answer: PullAnswer;
  now: number;
  skewMs: number | null;
}

/** The row of another phone's operation, or of one that left this phone's care long ago. */
function remoteOp(row: PullRow, key: string, { answer, now }: Page): LocalOp {
  const { seq, actor, flags, receivedAt: _arrival, ...op } = row;
  const { kind, nest, visit, reading, n } = op;
  const learnt = { outcome: 'applied' as const, code: null, seq, epoch: answer.epoch, flags, seen: true, triedAt: null };
  return { key, op, kind, nest, visit, reading, n, state: 'remote', actor, savedAt: now, ...learnt };
}

/** This phone's own operation after it came back. Its state stays: only an answer to a push empties the queue. */
function ownOp(own: LocalOp, { seq, actor, flags }: PullRow, epoch: number): LocalOp {
  const seen = { ...own, actor, flags };
  if (own.state !== 'held') return seen;
  return { ...seen, seq, epoch, outcome: own.outcome === 'duplicate' ? 'duplicate' : 'applied', code: null };
}

function storedRow(row: PullRow, before: Snapshot, page: Page): LocalOp {
  const own = before.ops.get(row.opId);
  if (!own || own.state === 'remote') return remoteOp(row, row.opId, page);
  if (own.op.bodyHash !== row.bodyHash) return remoteOp(row, officeKey(row.opId), page);
  return ownOp(own, row, page.answer.epoch);
}

/** The clock after the rows were seen, so that what is made next comes after what could be read. */
function advancedHlc(meta: StoreMeta, rows: readonly PullRow[], now: number): string {
  let hlc = parseHlc(meta.hlc) ?? { ms: 0, counter: 0 };
  for (const row of rows) {
    const remote = parseHlc(row.hlc);
    if (remote) hlc = receiveHlc(hlc, remote, now);
  }
  return formatHlc(hlc);
}

/** The `seq` after a page; null when its rows do not follow its start in order. */
function seqAfter({ start, answer }: Page): number | null {
  const next = parseCursor(answer.next);
  let last = start.cursor;
  for (const { seq } of answer.rows) {
    if (seq <= last) return null;
    last = seq;
  }
  return next && next.epoch === start.epoch && next.seq >= last ? next.seq : null;
}

/**
 * Takes in a page: its rows and the cursor in one transaction. A page that does not start where this phone stands is
 * ignored: it is late, or someone else's.
 *
 * @returns a change whose result tells whether the page was taken.
 */
export function applyPage(page: Page) {
  const { start, answer, now, skewMs } = page;
  return (before: Snapshot): Change<boolean> => {
    const { meta } = before;
    const cursor = seqAfter(page);
    if (!meta || meta.epoch !== start.epoch || meta.cursor !== start.cursor) return { result: false };
    if (answer.epoch !== meta.epoch || cursor === null) return { result: false };
    const complete = meta.resync && !answer.more;
    return {
      result: true,
      ops: answer.rows.map((row) => storedRow(row, before, page)),
      meta: {
        ...meta,
        cursor,
        hlc: advancedHlc(meta, answer.rows, now),
        safeSeq: answer.safeSeq,
        skewMs: skewMs ?? meta.skewMs,
        resync: meta.resync && answer.more,
      },
      keepEpoch: complete ? meta.epoch : undefined,
    };
  };
}

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
  const { verdict, now, skewMs } = await askOffice(ports, pullRequest(meta), PULL_ANSWER);
  if (verdict.kind === 'restart') {
    await ports.store.transact([], fromTheStart(meta.epoch));
    return { end: null, more: meta.cursor > 0 };
  }
  if (verdict.kind !== 'ok') return { end: endOf(verdict, meta.epoch), more: false };
  const answer = verdict.value;
  const page = { start: { epoch: meta.epoch, cursor: meta.cursor }, answer, now, skewMs };
  const keys = answer.rows.map((row) => row.opId);
  if (await ports.store.transact(keys, applyPage(page))) return { end: null, more: answer.more };
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
