import { describe, expect, it } from 'vitest';
import { cellModel } from '@/lib/brood/hmm/cell-model';
import { historyAnswer } from '@/lib/brood/hmm/history-answer';
import { erlangStage } from '@/lib/brood/hmm/stage-fit';
import { passageSince, passageTo } from '@/lib/brood/passage';
import { equilibriumWeights, phaseChain } from '@/lib/brood/phase-chain';
import { passageCdf, stageOccupancy } from '@/tests/unit/brood/passages';

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
    const [egg, larva, pupa, out] = stageOccupancy(phaseChain(SHAPES), 30);
    const kinds = filtered?.[0] ?? {};
    [kinds['egg#1'], kinds['larva#1'], kinds['pupa#1'], kinds['EM#1']].forEach((p, i) => {
      expect(p).toBeCloseTo([egg, larva, pupa, out][i] ?? NaN, 12);
    });
    expect(kinds['larva#1']).toBeCloseTo(0.563687328, 9);
  });

  it('gives one sighting the equilibrium law when the egg may have been laid on any day (renewal theory)', () => {
    const chain = phaseChain(SHAPES);
    const weights = equilibriumWeights(chain, { from: 9, to: 17 });
    const answer = historyAnswer(model(1e-9, 'B', -200), { times: [0], observations: ['larva'] }, ONE_DAY);
    const since = passageSince(chain, 0, weights);
    answer.laying?.times.forEach((time, i) => {
      expect(Math.abs((answer.laying?.first[i] ?? NaN) - (1 - passageCdf(chain, since, -time)))).toBeLessThan(1e-6);
    });
    ONE_DAY.daysAfter.forEach((days, i) => {
      const capped = passageCdf(chain, passageTo(chain, weights, 17), days);
      expect(Math.abs((answer.outlook?.capped[i] ?? NaN) - capped)).toBeLessThan(1e-6);
    });
  });
});
