import type { FactorNode } from './nest-factor';
import { type PhaseChain, equilibriumWeights, phasesOf } from './phase-chain';
import type { BroodSettings } from './settings';
import type { StageGroup } from './stages';

/** Probability of ending as a lost egg, a lost larva or lost capped brood; what is left of 1 comes out. */
export interface LossByStage {
  egg: number;
  larva: number;
  capped: number;
}

/** The daily loss of each phase of the chain. */
function phaseHazards(chain: PhaseChain, { values }: BroodSettings): number[] {
  const larvae = phasesOf(chain, { first: 1, last: 5 });
  return Array.from(chain.rates, (_, i) => {
    if (i < larvae.from) return values.lossEgg.value;
    return i < larvae.to ? values.lossLarva.value : values.lossCapped.value;
  });
}

/**
 * What becomes of a brood seen in a group of stages: in each phase development (rate λρ) and loss (hazard μ) race,
 * so the phase is lost with probability μ / (λρ + μ).
 *
 * @returns one entry for each value of the nest factor.
 */
export function lossesByNode(
  chain: PhaseChain,
  settings: BroodSettings,
  seen: { group: StageGroup; nodes: readonly FactorNode[] },
): LossByStage[] {
  const hazards = phaseHazards(chain, settings);
  const larvae = phasesOf(chain, { first: 1, last: 5 });
  const start = equilibriumWeights(chain, phasesOf(chain, seen.group));
  return seen.nodes.map(({ rate }) => {
    const losses = { egg: 0, larva: 0, capped: 0 };
    let alive = 0;
    chain.rates.forEach((development, i) => {
      alive += start[i] ?? 0;
      const lost = (alive * (hazards[i] ?? 0)) / (development * rate + (hazards[i] ?? 0));
      losses[i < larvae.from ? 'egg' : i < larvae.to ? 'larva' : 'capped'] += lost;
      alive -= lost;
    });
    return losses;
  });
}

/** The whole probability of being lost. */
export function lossTotal({ egg, larva, capped }: LossByStage): number {
  return egg + larva + capped;
}
