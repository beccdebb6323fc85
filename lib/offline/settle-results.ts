import { HELD_OUTCOMES, PUSH_OUTCOMES, type PushOutcome } from '@/lib/protocol/push';
import type { PushAnswer } from './answer-shapes';
import type { LocalOp } from './local-op';
import type { Change, Snapshot } from './store';

type Result = PushAnswer['results'][number];

/** The part of an answer and its circumstances that settling needs. */
export interface Settlement {
  answer: PushAnswer;
  /** The phone's clock when the answer came. */
  now: number;
  skewMs: number | null;
}

function outcomeOf(r: string): PushOutcome | null {
  return PUSH_OUTCOMES.find((known) => known === r) ?? null;
}

/** The result about this operation: the same id and the same body, or it is about something else. */
function resultFor({ op }: LocalOp, results: readonly Result[]): Result | undefined {
  return results.find((result) => result.opId === op.opId && result.bodyHash === op.bodyHash);
}

/** The operation after its result: held, refused, or still in the queue. */
function settled(row: LocalOp, result: Result, { answer, now }: Settlement): LocalOp | null {
  const outcome = outcomeOf(result.r);
  if (outcome === null || outcome === 'retry') return null;
  const code = result.code ?? null;
  const learnt = { outcome, code, epoch: answer.epoch, triedAt: now };
  if (!HELD_OUTCOMES.has(outcome)) return { ...row, ...learnt, state: 'refused' };
  return { ...row, ...learnt, state: 'held', seq: result.seq ?? 0 };
}

/**
 * What an answer takes out of the queue. An operation counts as held only when it is listed by id with an equal body
 * hash and an outcome that says the office has it, in the epoch that this phone lives in. A mere 200 proves nothing.
 *
 * @returns a change whose result is the number of operations that left the queue.
 */
export function settleResults(settlement: Settlement) {
  const { answer, skewMs } = settlement;
  return ({ meta, ops }: Snapshot): Change<number> => {
    if (!meta || answer.epoch !== meta.epoch) return { result: 0 };
    const changed: LocalOp[] = [];
    for (const row of ops.values()) {
      if (row.state !== 'queued' && row.state !== 'suspect') continue;
      const result = resultFor(row, answer.results);
      const after = result && settled(row, result, settlement);
      if (after) changed.push(after);
    }
    const { safeSeq, epoch: deviceEpoch } = answer;
    const learnt = { ...meta, safeSeq, deviceEpoch, skewMs: skewMs ?? meta.skewMs };
    return { result: changed.length, ops: changed, meta: learnt };
  };
}
