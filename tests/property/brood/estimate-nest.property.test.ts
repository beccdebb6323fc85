import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CELL_STATES } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import type { BroodEstimate, DateRange, Spread } from '@/lib/brood/answer';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodInput, BroodMark, BroodReading } from '@/lib/brood/input';
import { passageSince, passageTo } from '@/lib/brood/passage';
import { equilibriumWeights, phaseChain } from '@/lib/brood/phase-chain';
import { passageCdf } from '@/tests/unit/brood/passages';

const DAY_MS = 86_400_000;
const START = Date.parse('2026-05-15T09:00:00Z');
const RUNS = { numRuns: 25, seed: 2026 };

/** One mark a cell along the spiral. */
const marksArb = fc
  .array(fc.record({ state: fc.constantFrom(...CELL_STATES), unsure: fc.boolean(), reused: fc.boolean() }), {
    minLength: 1,
    maxLength: 12,
  })
  .map((cells) => spiral(cells.length).map<BroodMark>((at, i) => ({ ...at, state: 'unread', ...cells[i] })));

/** One to four readings on different days, in any order. */
const readingsArb = fc
  .uniqueArray(fc.record({ day: fc.integer({ min: 0, max: 60 }), marks: marksArb }), {
    selector: ({ day }) => day,
    minLength: 1,
    maxLength: 4,
  })
  .map((visits) =>
    visits.map<BroodReading>(({ day, marks }) => ({ id: `day-${day}`, at: START + day * DAY_MS, marks })),
  );

function estimate(readings: readonly BroodReading[], rest: Partial<BroodInput> = {}): BroodEstimate {
  const asOf = START + 61 * DAY_MS;
  return estimateNest({ nest: 'n', zone: 'UTC', asOf, taxon: null, readings, ...rest });
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

describe('estimates, whatever the readings', () => {
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

  it('give cells with equal records equal answers', () => {
    fc.assert(
      fc.property(readingsArb, (readings) => {
        const doubled = readings.map((reading) => ({
          ...reading,
          marks: reading.marks.flatMap((mark) => [mark, { ...mark, q: mark.q + 20 }]),
        }));
        const { cells } = estimate(doubled);
        const twins = new Map(cells.map((cell) => [`${cell.q},${cell.r}`, cell]));
        for (const cell of cells.filter(({ q }) => q < 10)) {
          expect(twins.get(`${cell.q + 20},${cell.r}`)).toEqual({ ...cell, q: cell.q + 20 });
        }
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

describe('scaling', () => {
  it('changes nothing when all durations and the clock are stretched alike', () => {
    const stageArb = fc.record({
      phases: fc.integer({ min: 1, max: 40 }),
      meanDays: fc.double({ min: 0.5, max: 30, noNaN: true }),
    });
    fc.assert(
      fc.property(
        fc.array(stageArb, { minLength: 1, maxLength: 5 }),
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        (stages, factor) => {
          const chain = phaseChain(stages);
          const stretched = phaseChain(stages.map(({ phases, meanDays }) => ({ phases, meanDays: meanDays * factor })));
          const run = { from: 0, to: chain.rates.length };
          const total = stages.reduce((sum, { meanDays }) => sum + meanDays, 0);
          for (const part of [0.1, 0.5, 1, 1.7]) {
            const laws = [chain, stretched].map((one, i) => {
              const weights = equilibriumWeights(one, run);
              const days = part * total * (i === 0 ? 1 : factor);
              return [
                passageCdf(one, passageSince(one, 0, weights), days),
                passageCdf(one, passageTo(one, weights, run.to), days),
              ];
            });
            laws[0]?.forEach((p, i) => expect(Math.abs(p - (laws[1]?.[i] ?? NaN))).toBeLessThan(1e-11));
          }
        },
      ),
      RUNS,
    );
  });
});
