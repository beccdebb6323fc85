import { describe, expect, test } from 'vitest';
import type { PullAnswer } from '@/lib/offline/answer-shapes';
import { applyPage } from '@/lib/offline/apply-page';
import { type LocalOp, officeKey } from '@/lib/offline/local-op';
import type { StoreMeta } from '@/lib/offline/store';
import type { PullRow } from '@/lib/protocol/pull';
import { OTHER, id, meta, op, row } from '@/tests/support/sim/local-ops';

const NOW = 2_000;

const officeRow = (n: number, seq: number, part: Partial<PullRow> = {}): PullRow => ({
  ...op({ kind: 'cell.mark', n }),
  seq,
  actor: OTHER,
  receivedAt: '2026-06-16T09:41:08.000Z',
  flags: ['late'],
  ...part,
});

interface Case {
  phone?: StoreMeta | null;
  own?: readonly LocalOp[];
  start?: { epoch: number; cursor: number };
}

function apply(
  rows: PullRow[],
  { phone = meta(), own = [], start = { epoch: 1, cursor: 0 } }: Case = {},
  more: Partial<PullAnswer> = {},
) {
  const next = `${start.epoch}:${rows.at(-1)?.seq ?? start.cursor}`;
  const answer = { protocol: 1 as const, epoch: 1, serverTime: '', safeSeq: 3, rows, next, more: false, ...more };
  const ops = new Map(own.map((found) => [found.key, found]));
  return applyPage({ start, answer, now: NOW, skewMs: null })({ meta: phone, ops });
}

describe('a page', () => {
  test('brings its rows and the cursor after them, in one change', () => {
    const change = apply([officeRow(1, 1), officeRow(2, 2)]);
    expect(change.result).toBe(true);
    expect(change.ops?.map(({ key, state, seq, actor, epoch }) => [key, state, seq, actor, epoch])).toEqual([
      [id(1), 'remote', 1, OTHER, 1],
      [id(2), 'remote', 2, OTHER, 1],
    ]);
    expect(change.meta).toMatchObject({ cursor: 2, safeSeq: 3 });
  });

  test('leaves the bare operation in the row, as it was sent', () => {
    expect(apply([officeRow(1, 1)]).ops?.[0]?.op).toEqual(op({ kind: 'cell.mark', n: 1 }));
  });

  test('moves the clock past what could be read', () => {
    expect(apply([officeRow(1, 1, { hlc: '1990.4' })]).meta?.hlc).toBe('2000.0');
    expect(apply([officeRow(1, 1, { hlc: '2500.4' })]).meta?.hlc).toBe('2500.5');
  });

  test('does not follow a clock that is far ahead', () => {
    expect(apply([officeRow(1, 1, { hlc: '99999999.0' })]).meta?.hlc).toBe('2000.0');
  });
});

test('a page without rows may bring the cursor back, when the office has less than it had', () => {
  const known = { phone: meta({ cursor: 9 }), start: { epoch: 1, cursor: 9 } };
  expect(apply([], known, { next: '1:7' }).meta?.cursor).toBe(7);
});

describe('a page is ignored', () => {
  test.each<[string, Case, Partial<PullAnswer>]>([
    ['when it starts behind the cursor', { phone: meta({ cursor: 5 }) }, {}],
    ['when it starts ahead of the cursor', { start: { epoch: 1, cursor: 4 } }, {}],
    ['when the phone lives in another epoch by now', { phone: meta({ epoch: 2 }) }, {}],
    ['when its answer is of another epoch', {}, { epoch: 2 }],
    ['when its next cursor is not one', {}, { next: 'soon' }],
    ['when its next cursor lies before its rows', {}, { next: '1:0' }],
    ['when the storage was emptied meanwhile', { phone: null }, {}],
  ])('%s', (_when, known, more) => {
    expect(apply([officeRow(9, 9)], known, more)).toEqual({ result: false });
  });

  test('when its rows are out of order', () => {
    expect(apply([officeRow(2, 2), officeRow(1, 1)])).toEqual({ result: false });
  });
});

describe('an operation of this phone that comes back', () => {
  test('stays queued, because only an answer to a push empties the queue', () => {
    const change = apply([officeRow(1, 4)], { own: [row({ kind: 'cell.mark', n: 1 })] });
    expect(change.ops).toMatchObject([{ state: 'queued', seq: 0, actor: OTHER, flags: ['late'] }]);
  });

  test('gets its place when it is held, and is no longer parked', () => {
    const own = [row({ kind: 'cell.mark', n: 1 }, { state: 'held', outcome: 'parked', code: 'deps' })];
    expect(apply([officeRow(1, 4)], { own }).ops).toMatchObject([
      { state: 'held', outcome: 'applied', code: null, seq: 4, epoch: 1 },
    ]);
  });

  test('is kept beside an office row that contradicts it', () => {
    const own = [row({ kind: 'cell.mark', n: 1 }, { state: 'held', outcome: 'conflict' })];
    const change = apply([officeRow(1, 4, { bodyHash: 'another' })], { own });
    expect(change.ops).toMatchObject([{ key: officeKey(id(1)), state: 'remote' }]);
  });
});

describe('after a restore', () => {
  const phone = meta({ resync: true });

  test('rows of the old epoch stay until the last page is here', () => {
    const first = apply([officeRow(1, 1)], { phone }, { more: true });
    expect(first).toMatchObject({ meta: { resync: true } });
    expect(first.keepEpoch).toBeUndefined();
    expect(apply([officeRow(1, 1)], { phone })).toMatchObject({ meta: { resync: false }, keepEpoch: 1 });
  });
});
