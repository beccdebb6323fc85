import { describe, expect, test } from 'vitest';
import type { PushAnswer } from '@/lib/offline/answer-shapes';
import type { LocalOp } from '@/lib/offline/local-op';
import { settleResults } from '@/lib/offline/settle-results';
import type { StoreMeta } from '@/lib/offline/store';
import { id, meta, row } from '@/tests/support/sim/local-ops';

type Result = PushAnswer['results'][number];

const NOW = 5_000;

const mark = (n: number, part: Partial<LocalOp> = {}) => row({ kind: 'cell.mark', n }, part);
const result = (n: number, r: string, more: Partial<Result> = {}): Result => ({
  opId: id(n),
  bodyHash: `hash-${n}`,
  r,
  ...more,
});

function settle(rows: readonly LocalOp[], results: Result[], { epoch = 1, phone = meta() as StoreMeta | null } = {}) {
  const answer = { protocol: 1 as const, epoch, serverTime: '', safeSeq: 40, results };
  const ops = new Map(rows.map((found) => [found.key, found]));
  return settleResults({ answer, now: NOW, skewMs: -840 })({ meta: phone, ops });
}

describe('an operation leaves the queue', () => {
  test.each(['applied', 'duplicate', 'parked', 'quarantined', 'conflict'])('when the office says %s', (r) => {
    const change = settle([mark(1)], [result(1, r, { seq: 7, code: 'why' })]);
    expect(change.result).toBe(1);
    expect(change.ops).toEqual([
      mark(1, { state: 'held', outcome: change.ops?.[0]?.outcome, code: 'why', seq: 7, epoch: 1, triedAt: NOW }),
    ]);
    expect(change.ops?.[0]?.outcome).toBe(r);
  });

  test('also when it was a suspect', () => {
    expect(settle([mark(1, { state: 'suspect' })], [result(1, 'applied', { seq: 1 })]).ops?.[0]?.state).toBe('held');
  });

  test('to the refused ones when the office refuses it', () => {
    const change = settle([mark(1)], [result(1, 'refused', { code: 'right' })]);
    expect(change.ops).toMatchObject([{ state: 'refused', code: 'right' }]);
  });
});

describe('an operation stays in the queue', () => {
  test.each([
    ['it is not listed', [result(2, 'applied')]],
    ['the list is empty', []],
    ['its body hash differs', [result(1, 'applied', { bodyHash: 'another' })]],
    ['its body hash is missing', [result(1, 'applied', { bodyHash: null })]],
    ['the office asks to retry', [result(1, 'retry')]],
    ['the outcome is a word of a newer office', [result(1, 'filed')]],
    ['the id is not one', [{ ...result(1, 'applied'), opId: 17 }]],
  ])('when %s', (_why, results) => {
    const change = settle([mark(1)], results);
    expect(change).toMatchObject({ result: 0, ops: [] });
  });

  test('when the answer is of another epoch', () => {
    expect(settle([mark(1)], [result(1, 'applied', { seq: 1 })], { epoch: 2 })).toEqual({ result: 0 });
  });

  test('when the storage was emptied meanwhile', () => {
    expect(settle([mark(1)], [result(1, 'applied', { seq: 1 })], { phone: null })).toEqual({ result: 0 });
  });
});

test('each operation gets its own result, whatever the order', () => {
  const change = settle([mark(1), mark(2), mark(3)], [result(3, 'applied', { seq: 9 }), result(1, 'refused')]);
  expect(change.ops?.map(({ n, state, seq }) => [n, state, seq])).toEqual([
    [1, 'refused', 0],
    [3, 'held', 9],
  ]);
});

test('an operation that is held already is not touched by a late answer', () => {
  const held = mark(1, { state: 'held', outcome: 'applied', seq: 3 });
  expect(settle([held], [result(1, 'refused')]).ops).toEqual([]);
});

test('the answer also tells what is safe and how the clocks differ', () => {
  expect(settle([], []).meta).toEqual(meta({ safeSeq: 40, skewMs: -840 }));
});
