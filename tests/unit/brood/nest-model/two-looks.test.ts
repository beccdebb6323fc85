import { describe, expect, it } from 'vitest';
import type { CellState } from '@/lib/comb/states';
import type { DateRange } from '@/lib/brood/answer';
import { NO_SPREAD, estimate, reading } from '@/tests/unit/brood/support';

const DAY_MS = 86_400_000;
const START = Date.parse('2026-06-15T12:00:00Z');

/** One cell seen in two states so many days apart. */
function twoLooks(first: CellState, second: CellState, days: number) {
  const at = (day: number) => new Date(START + day * DAY_MS).toISOString();
  const marks = (state: CellState) => [{ q: 0, r: 0, state }];
  const readings = [reading(at(0), marks(first)), reading(at(days), marks(second))];
  return estimate(readings, { settings: NO_SPREAD, zone: 'UTC' }).cells[0];
}

/** The 95 % range in days since the first look. */
function daysOf(range: DateRange | null | undefined): readonly [number, number] {
  const [from = '', to = ''] = range?.utc.p95 ?? [];
  return [(Date.parse(from) - START) / DAY_MS, (Date.parse(to) - START) / DAY_MS];
}

/** The spread left in egg and larva is 0.86 days (0.05 of 11, 0.07 of each instar); the ends lie within two of it. */
const SLACK = 1.75;

/** Does a range fill the arithmetic one? */
function expectRange([low, high]: readonly [number, number], [from, to]: readonly [number, number]) {
  expect(
    [low, high].map((day, i) => Math.abs(day - (i === 0 ? from : to)) <= SLACK),
    `${low} to ${high}`,
  ).toEqual([true, true]);
}

describe(
  'two looks narrow each other (M rows: arithmetic with next to no spread, no biology)',
  { timeout: 60_000 },
  () => {
    it('M C16: an egg that is a larva a week later was 4 to 11 days old at the first look', () => {
      expectRange(daysOf(twoLooks('egg', 'small', 7)?.laid), [-11, -4]);
    });

    it('M C17: a larva that is capped 5 days later was laid 26 to 31 days before the first look and comes out on day 14 to 19', () => {
      const cell = twoLooks('large', 'capped', 5);
      expectRange(daysOf(cell?.laid), [-31, -26]);
      expectRange(daysOf(cell?.emerges), [14, 19]);
    });
  },
);
