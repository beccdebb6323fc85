import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CELL_STATES } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import type { BroodEstimate, DateRange, Spread } from '@/lib/brood/answer';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodInput, BroodMark, BroodReading } from '@/lib/brood/input';
import { COARSE } from '@/tests/unit/brood/support';
const DAY_MS = 86_400_000;
const START = Date.parse('2026-05-15T09:00:00Z');
const RUNS = { numRuns: 6, seed: 2026 };

/** One mark a cell along the spiral. */
const marksArb = fc
  .array(fc.record({ state: fc.constantFrom(...CELL_STATES), unsure: fc.boolean(), reused: fc.boolean() }), {
    minLength: 1,
    maxLength: 7,
  })
  .map((cells) => spiral(cells.length).map<BroodMark>((at, i) => ({ ...at, state: 'unread', ...cells[i] })));

/** One to four readings on different days, in any order. */
const readingsArb = fc
  .uniqueArray(fc.record({ day: fc.integer({ min: 0, max: 60 }), marks: marksArb }), {
    selector: ({ day }) => day,
    minLength: 1,
    maxLength: 3,
  })
  .map((visits) =>
    visits.map<BroodReading>(({ day, marks }) => ({ id: `day-${day}`, at: START + day * DAY_MS, marks })),
  );

function estimate(readings: readonly BroodReading[], rest: Partial<BroodInput> = {}): BroodEstimate {
  const asOf = START + 61 * DAY_MS;
  return estimateNest({ nest: 'n', zone: 'UTC', asOf, taxon: null, readings, settings: COARSE, ...rest });
}

/** The seven instants of a range. */
function instants({ median, p50, p80, p95 }: Spread): number[] {
  return [median, ...p50, ...p80, ...p95].map((text) => Date.parse(text));
}

/** All instants of an answer in a fixed order. */
function allInstants({ cells, nest }: BroodEstimate): number[] {
  const ranges = [
    ...cells.flatMap(({ laid, capped, emerges }) => [laid, capped, emerges]),
    nest.founded,
    nest.firstEmergence,
  ];
  return ranges.filter((range): range is DateRange => range !== null).flatMap(({ utc }) => instants(utc));
}

describe('estimates, whatever the readings', { timeout: 120_000 }, () => {
  it('shift with the times of the readings, to the millisecond', () => {
    fc.assert(
      fc.property(readingsArb, fc.integer({ min: -400, max: 400 }), (readings, days) => {
        const by = days * DAY_MS;
        const moved = readings.map((reading) => ({ ...reading, at: reading.at + by }));
        const shifted = estimate(moved, { asOf: START + 61 * DAY_MS + by });
        expect(allInstants(shifted)).toEqual(allInstants(estimate(readings)).map((ms) => ms + by));
        expect(shifted.nest.season).toBe(estimate(readings).nest.season);
      }),
      RUNS,
    );
  });

  it('do not change with stored nectar, nor with the order of readings and marks', () => {
    fc.assert(
      fc.property(readingsArb, (readings) => {
        const changed = [...readings].reverse().map((reading) => ({
          ...reading,
          marks: [...reading.marks].reverse().map((mark) => ({ ...mark, nectar: true })),
        }));
        expect(estimate(changed)).toEqual(estimate(readings));
      }),
      RUNS,
    );
  });

  it('do not change with a visit at which no cell could be looked into', () => {
    fc.assert(
      fc.property(readingsArb, (readings) => {
        const marks = readings.flatMap((reading) => reading.marks);
        const cells = [...new Map(marks.map(({ q, r }) => [`${q},${r}`, { q, r, state: 'unread' as const }])).values()];
        const unread = { id: 'unread', at: START + 30.5 * DAY_MS, marks: cells };
        const { cells: before, nest } = estimate(readings);
        expect(estimate([...readings, unread])).toMatchObject({ cells: before, nest });
      }),
      RUNS,
    );
  });

  it('give cells with equal records at equal distances from the pedicel equal answers', () => {
    fc.assert(
      fc.property(readingsArb, (readings) => {
        const mirrored = readings.map((reading) => ({
          ...reading,
          marks: reading.marks.flatMap((mark, i) => [1, -1].map((side) => ({ ...mark, q: side * (i + 1), r: 0 }))),
        }));
        const { cells } = estimate(mirrored);
        const byCell = new Map(cells.map((cell) => [`${cell.q},${cell.r}`, cell]));
        for (const cell of cells) expect(byCell.get(`${-cell.q},${cell.r}`)).toEqual({ ...cell, q: -cell.q });
      }),
      RUNS,
    );
  });

  it('are finite, ordered and probable', () => {
    fc.assert(
      fc.property(readingsArb, (readings) => {
        const answer = estimate(readings);
        expect(allInstants(answer).every(Number.isFinite)).toBe(true);
        for (const { emerges, lost, laid } of answer.cells) {
          expect(lost.probability >= 0 && lost.probability <= 1).toBe(true);
          if (emerges && laid) expect(laid.utc.p95[0] <= emerges.utc.p95[1]).toBe(true);
        }
        for (const { expected, lo80, hi80 } of answer.nest.emergencePerDay) {
          expect(expected >= 0 && lo80 <= hi80 && hi80 <= answer.cells.length).toBe(true);
        }
      }),
      RUNS,
    );
  });
});
