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

/** What is lost in each phase of the chain: an egg, a larva or capped brood. */
function phaseFates(chain: PhaseChain): (keyof LossByStage)[] {
  const larvae = phasesOf(chain, { first: 1, last: 5 });
  return Array.from(chain.rates, (_, i) => {
    if (i < larvae.from) return 'egg';
    return i < larvae.to ? 'larva' : 'capped';
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
  { values }: BroodSettings,
  seen: { group: StageGroup; nodes: readonly FactorNode[] },
): LossByStage[] {
  const hazards: LossByStage = {
    egg: values.lossEgg.value,
    larva: values.lossLarva.value,
    capped: values.lossCapped.value,
  };
  const fates = phaseFates(chain);
  const start = equilibriumWeights(chain, phasesOf(chain, seen.group));
  return seen.nodes.map(({ rate }) => {
    const losses = { egg: 0, larva: 0, capped: 0 };
    let alive = 0;
    chain.rates.forEach((development, i) => {
      alive += start[i] ?? 0;
      const fate = fates[i] ?? 'capped';
      const lost = (alive * hazards[fate]) / (development * rate + hazards[fate]);
      losses[fate] += lost;
      alive -= lost;
    });
    return losses;
  });
}

/** The whole probability of being lost. */
export function lossTotal({ egg, larva, capped }: LossByStage): number {
  return egg + larva + capped;
}
