import { describe, expect, test } from 'vitest';
import { adoptEpoch } from '@/lib/offline/adopt-epoch';
import type { LocalOp } from '@/lib/offline/local-op';
import { releaseSafe, RETAIN_MS } from '@/lib/offline/purge';
import { requeueLost } from '@/lib/offline/reoffer';
import { id, meta, row } from '@/tests/support/sim/local-ops';

const held = (n: number, part: Partial<LocalOp> = {}) =>
  row({ kind: 'cell.mark', n }, { state: 'held', outcome: 'applied', seq: n, epoch: 1, ...part });

const snapshot = (rows: readonly LocalOp[], phone = meta()) => ({
  meta: phone,
  ops: new Map(rows.map((r) => [r.key, r])),
});

describe('a new epoch', () => {
  test('starts the log anew, offers everything again and keeps the clock and the number', () => {
    const before = meta({ epoch: 1, cursor: 70, safeSeq: 60, n: 9, hlc: '8.1' });
    expect(adoptEpoch(1, 2)(snapshot([], before))).toEqual({
      result: true,
      meta: { ...before, epoch: 2, cursor: 0, safeSeq: 0, reofferAfter: '', resync: true },
    });
  });

  test('is adopted once, when two tabs learn of it', () => {
    expect(adoptEpoch(1, 2)(snapshot([], meta({ epoch: 2 })))).toEqual({ result: false });
    expect(adoptEpoch(2, 2)(snapshot([], meta({ epoch: 2 })))).toEqual({ result: false });
  });
});

describe('what the office has lost', () => {
  const offer = { epoch: 1, after: '', next: null, have: new Set([id(1), id(3), id(4)]) };
  const phone = meta({ reofferAfter: '' });

  test('goes back into the queue as if it had never been sent', () => {
    const change = requeueLost(offer)(snapshot([held(1), held(2)], phone));
    expect(change.ops).toEqual([row({ kind: 'cell.mark', n: 2 })]);
    expect(change.meta?.reofferAfter).toBeNull();
  });

  test('includes what it had set aside: knowing an id does not prove its body', () => {
    const aside = [
      held(3, { outcome: 'conflict' }),
      held(4, { outcome: 'parked' }),
      held(5, { outcome: 'quarantined' }),
    ];
    const change = requeueLost(offer)(snapshot(aside, phone));
    expect(change.ops?.map(({ n, state }) => [n, state])).toEqual([3, 4, 5].map((n) => [n, 'queued']));
  });

  test('does not include what is not held', () => {
    const others = [held(6, { state: 'refused' }), held(7, { state: 'remote' }), held(8, { state: 'suspect' })];
    expect(requeueLost(offer)(snapshot(others, phone)).ops).toEqual([]);
  });

  test.each([
    ['of another epoch', meta({ epoch: 2, reofferAfter: '' })],
    ['that another tab has asked already', meta({ reofferAfter: id(9) })],
    ['that nobody asks any more', meta()],
  ])('is not judged by a page %s', (_what, now) => {
    expect(requeueLost(offer)(snapshot([held(2)], now))).toEqual({ result: false });
  });
});

describe('an operation is let go', () => {
  const phone = meta({ safeSeq: 10, cursor: 20 });
  const late = RETAIN_MS + 1;
  const released = (part: Partial<LocalOp>, now = late, known = phone) =>
    releaseSafe(now)(snapshot([held(5, part)], known)).result;

  test('when a backup has it and thirty days have passed; it stays as a row of the office', () => {
    expect(releaseSafe(late)(snapshot([held(5)], phone)).ops).toMatchObject([{ n: 5, state: 'remote' }]);
  });

  test.each<[string, Partial<LocalOp>]>([
    ['it is not in every backup', { seq: 11 }],
    ['it is younger', { savedAt: 5 }],
    ['it has no place in the log', { seq: 0, outcome: 'quarantined' }],
    ['its place is of another epoch', { epoch: 2 }],
    ['it is still queued', { state: 'queued' }],
  ])('not when %s', (_why, part) => {
    expect(released(part)).toBe(0);
  });

  test('not while a restore is being caught up with', () => {
    expect(released({}, late, { ...phone, resync: true })).toBe(0);
    expect(released({}, late, { ...phone, reofferAfter: '' })).toBe(0);
    expect(released({}, late, { ...phone, cursor: 4 })).toBe(0);
  });
});
