import { describe, expect, it } from 'vitest';
import { cellModel } from '@/lib/brood/hmm/cell-model';
import { historyAnswer } from '@/lib/brood/hmm/history-answer';
import { erlangStage } from '@/lib/brood/hmm/stage-fit';
import { enteredWithin, massesAt, reachedBy } from '@/tests/unit/brood/stage-rows';

const SHAPES = [
  { name: 'egg', phases: 9, meanDays: 12 },
  { name: 'larva', phases: 8, meanDays: 20 },
  { name: 'pupa', phases: 16, meanDays: 18 },
];
const stages = SHAPES.map(({ name, phases, meanDays }) => ({ name, ...erlangStage(phases, meanDays), lossPerDay: 0 }));
const identity = Object.fromEntries(['absent', 'empty', 'egg', 'larva', 'pupa'].map((name) => [name, { [name]: 1 }]));
const ONE_DAY = { step: 1, daysAfter: [2, 5, 10, 20] };

/** A built cell without losses, laid in once, read without error. */
const model = (layFirst: number, startKey: string, t0: number) =>
  cellModel({
    stages,
    generations: 1,
    rates: { build: 0, layFirst, layNext: 0 },
    pieces: [{ from: 0, speeds: [1, 1, 1] }],
    confusion: identity,
    t0,
    startKey,
  });

describe('the general model in a simple case', () => {
  it('develops like the bare chain of stages (B06: 0.563687328 larva, 0.429997247 pupa, 0.005901010 out at 30 days)', () => {
    const { filtered } = historyAnswer(model(1, 'egg#1', 0), { times: [30], observations: [null] }, ONE_DAY);
    const masses = massesAt(SHAPES, 30);
    const [egg, larva, pupa, out] = [
      [0, 9],
      [9, 17],
      [17, 33],
      [33, 34],
    ].map(([from, to]) => masses.subarray(from, to).reduce((sum, p) => sum + p, 0));
    const kinds = filtered?.[0] ?? {};
    [kinds['egg#1'], kinds['larva#1'], kinds['pupa#1'], kinds['EM#1']].forEach((p, i) => {
      expect(p).toBeCloseTo([egg, larva, pupa, out][i] ?? NaN, 12);
    });
    expect(kinds['larva#1']).toBeCloseTo(0.563687328, 9);
  });

  it('gives one sighting the equilibrium law when the egg may have been laid on any day (renewal theory)', () => {
    const answer = historyAnswer(model(1e-9, 'B', -200), { times: [0], observations: ['larva'] }, ONE_DAY);
    answer.laying?.times.forEach((time, i) => {
      expect(Math.abs((answer.laying?.first[i] ?? NaN) - (1 - enteredWithin(SHAPES, [9, 17], -time)))).toBeLessThan(
        1e-6,
      );
    });
    ONE_DAY.daysAfter.forEach((days, i) => {
      const capped = reachedBy(SHAPES, [9, 17], days);
      expect(Math.abs((answer.outlook?.capped[i] ?? NaN) - capped)).toBeLessThan(1e-6);
    });
  });
});
