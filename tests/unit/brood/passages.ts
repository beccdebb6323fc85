import { passageTo } from '@/lib/brood/passage';
import type { PhaseChain } from '@/lib/brood/phase-chain';
import { poissonMean, poissonWeights } from '@/lib/brood/poisson';

/** P(passage takes at most `days`), exact: the ticks within `days` are Poisson. */
export function passageCdf(chain: PhaseChain, byTick: Float64Array, days: number): number {
  return days <= 0 ? 0 : poissonMean(byTick, poissonWeights(chain.clock * days));
}

/** P(each stage, then out of the chain) for a brood laid `age` days ago. */
export function stageOccupancy(chain: PhaseChain, age: number): number[] {
  const start = new Float64Array(chain.rates.length);
  start[0] = 1;
  const past = chain.starts.slice(1).map((end) => passageCdf(chain, passageTo(chain, start, end), age));
  return [...past, 0].map((left, stage) => (stage === 0 ? 1 : (past[stage - 1] ?? 1)) - left);
}
