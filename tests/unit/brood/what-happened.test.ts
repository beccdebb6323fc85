import { describe, expect, test } from 'vitest';
import type { BroodEstimate, CellEstimate, DateRange } from '@/lib/brood/answer';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodReading } from '@/lib/brood/input';
import { countHits, whatHappened } from '@/lib/brood/what-happened';
import type { CellState } from '@/lib/comb/states';

const ZONE = 'UTC';
const at = (day: string) => Date.parse(`${day}T12:00:00Z`);
const look = (day: string, state: CellState): BroodReading => ({
  id: day,
  at: at(day),
  marks: [{ q: 0, r: 0, state }],
});

const range = (p50: [string, string], p80: [string, string], p95: [string, string]): DateRange => {
  const spread = { median: p50[0], p50, p80, p95 };
  return { ...spread, utc: spread };
};

const CAPPED = range(['2026-06-09', '2026-06-11'], ['2026-06-07', '2026-06-13'], ['2026-06-04', '2026-06-16']);
const OUT = range(['2026-06-23', '2026-06-25'], ['2026-06-21', '2026-06-27'], ['2026-06-18', '2026-06-30']);

/** An estimate of one cell, as known on 1 June. */
function known(state: CellState): BroodEstimate {
  const readings = [look('2026-06-01', state)];
  const made = estimateNest({ nest: 'n', zone: ZONE, asOf: at('2026-06-01'), readings, taxon: null });
  const cells = made.cells.map((cell): CellEstimate => ({
    ...cell,
    laid: CAPPED,
    capped: CAPPED,
    emerges: { ...OUT, probability: 0.9 },
  }));
  return { ...made, cells };
}

const seen = (state: CellState, later: readonly [day: string, state: CellState][]) => {
  const readings = [look('2026-06-01', state), ...later.map(([day, each]) => look(day, each))];
  return whatHappened(known(state), readings);
};
const of = (event: 'capped' | 'emerges', ...args: Parameters<typeof seen>) =>
  seen(...args).find((check) => check.event === event)?.seen;

describe('what later readings show of one cell', () => {
  test('capping lies between the last look without a cap and the first with one', () => {
    const later = [
      ['2026-06-08', 'large'],
      ['2026-06-10', 'capped'],
      ['2026-06-12', 'capped'],
    ] as const;
    expect(
      of(
        'capped',
        'large',
        [...later].map(([day, state]) => [day, state]),
      ),
    ).toEqual({
      kind: 'between',
      from: '2026-06-08',
      to: '2026-06-10',
    });
  });

  test('a cell opened unseen was capped and left within the same days', () => {
    expect(of('capped', 'large', [['2026-06-28', 'opened']])).toMatchObject({ from: '2026-06-01', to: '2026-06-28' });
    expect(of('emerges', 'large', [['2026-06-28', 'opened']])).toMatchObject({ from: '2026-06-01', to: '2026-06-28' });
  });

  test('is not yet as long as the same brood is seen, whatever class it was read as', () => {
    expect(
      of('capped', 'large', [
        ['2026-06-08', 'medium'],
        ['2026-06-12', 'large'],
      ]),
    ).toEqual({ kind: 'not-yet' });
  });

  test.each([
    ['large', 'egg'],
    ['large', 'empty'],
    ['egg', 'dead'],
    ['egg', 'parasitised'],
  ] as const)('cannot be told when %s was followed by %s', (before, after) => {
    expect(
      of('capped', before, [
        ['2026-06-08', after],
        ['2026-06-28', 'opened'],
      ]),
    ).toEqual({ kind: 'lost' });
  });

  test('a capped cell found empty may have been left or lost: that is not counted as emergence', () => {
    expect(of('emerges', 'capped', [['2026-06-25', 'empty']])).toEqual({ kind: 'lost' });
  });

  test('a cell that was capped already has no capping to check', () => {
    expect(seen('capped', [['2026-06-25', 'opened']]).map(({ event }) => event)).toEqual(['emerges']);
  });

  test('says nothing of a cell that nobody looked into again', () => {
    expect(seen('large', [['2026-06-25', 'unread']])).toEqual([]);
    expect(seen('large', [])).toEqual([]);
  });
});

describe('the counts', () => {
  const capped = (later: readonly [string, CellState][]) => countHits(seen('large', later))[0];

  test('hold a range that contains every day the event can have been', () => {
    const counts = capped([
      ['2026-06-09', 'large'],
      ['2026-06-11', 'capped'],
      ['2026-06-20', 'capped'],
    ]);
    expect(counts).toMatchObject({
      p50: { n: 1, inside: 1, either: 0 },
      p80: { n: 1, inside: 1, either: 0 },
      p95: { n: 1, inside: 1, either: 0 },
    });
  });

  test('leave it open where the days reach across an end', () => {
    const counts = capped([
      ['2026-06-05', 'large'],
      ['2026-06-10', 'capped'],
      ['2026-06-20', 'capped'],
    ]);
    expect(counts).toMatchObject({ p50: { inside: 0, either: 1 }, p80: { inside: 0, either: 1 }, p95: { inside: 1 } });
  });

  test('count an early and a late event as outside', () => {
    const early = capped([
      ['2026-06-03', 'capped'],
      ['2026-06-20', 'capped'],
    ]);
    expect(early?.p95).toEqual({ n: 1, inside: 0, either: 0 });
    const late = capped([
      ['2026-06-18', 'large'],
      ['2026-06-20', 'capped'],
    ]);
    expect(late?.p95).toEqual({ n: 1, inside: 0, either: 0 });
    expect(capped([['2026-06-18', 'large']])?.p95).toEqual({ n: 1, inside: 0, either: 0 });
  });

  test('leave out a range that reaches past the last look, even when the event was seen in it', () => {
    const counts = capped([
      ['2026-06-09', 'large'],
      ['2026-06-11', 'capped'],
    ]);
    expect(counts).toMatchObject({ p50: { n: 1, inside: 1 }, p80: { n: 0 }, p95: { n: 0 } });
  });

  test('leave out lost brood and say how much', () => {
    expect(
      capped([
        ['2026-06-09', 'empty'],
        ['2026-06-30', 'empty'],
      ]),
    ).toMatchObject({ p95: { n: 0 }, lost: 1 });
  });
});
