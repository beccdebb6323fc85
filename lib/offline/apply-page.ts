import { formatHlc, parseHlc, receiveHlc } from '@/lib/kit/hlc';
import { type PullRow, parseCursor } from '@/lib/protocol/pull';
import type { PullAnswer } from './answer-shapes';
import { type LocalOp, officeKey } from './local-op';
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
  const learnt = {
    outcome: 'applied' as const,
    code: null,
    seq,
    epoch: answer.epoch,
    flags,
    seen: true,
    triedAt: null,
  };
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
  if (next?.epoch !== start.epoch) return null;
  // Without rows the office may bring a cursor back that lies beyond its end: reading twice is harmless.
  return answer.rows.length === 0 || next.seq >= last ? next.seq : null;
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
        deviceEpoch: answer.epoch,
        skewMs: skewMs ?? meta.skewMs,
        resync: meta.resync && answer.more,
      },
      keepEpoch: complete ? meta.epoch : undefined,
    };
  };
}
