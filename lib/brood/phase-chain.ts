import type { StageLaw } from './stages';

/** All stages in a row, cut into exponential phases. */
export interface PhaseChain {
  /** Rate of leaving each phase, per day. */
  rates: Float64Array;
  /** Index of the first phase of each stage, then the number of phases: `starts[s + 1]` is one past stage `s`. */
  starts: readonly number[];
  /** The largest rate: the clock of the uniformised chain. */
  clock: number;
}

/** A run of phases, `to` not included. */
interface PhaseRun {
  from: number;
  to: number;
}

/** Builds the chain: stage after stage, each as equal phases with rate phases ÷ mean. */
export function phaseChain(stages: readonly StageLaw[]): PhaseChain {
  const rates = stages.flatMap(({ phases, meanDays }) => Array<number>(phases).fill(phases / meanDays));
  const starts = stages.reduce<number[]>((ends, stage) => [...ends, (ends.at(-1) ?? 0) + stage.phases], [0]);
  return { rates: Float64Array.from(rates), starts, clock: Math.max(...rates) };
}

/** The phases of the stages `first` to `last`. */
export function phasesOf(chain: PhaseChain, { first, last }: { first: number; last: number }): PhaseRun {
  return { from: chain.starts[first] ?? 0, to: chain.starts[last + 1] ?? chain.rates.length };
}

/**
 * Where a brood stands when it is seen somewhere in a run of phases and may have been laid at any time before: each
 * phase has the weight of the time spent in it (the equilibrium law of renewal theory, Cox 1962).
 *
 * @returns one weight a phase of the whole chain, summing to 1.
 */
export function equilibriumWeights(chain: PhaseChain, { from, to }: PhaseRun): Float64Array {
  const weights = chain.rates.map((rate, i) => (i >= from && i < to ? 1 / rate : 0));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return weights.map((weight) => weight / total);
}

/**
 * One tick of the uniformised chain, in place: each phase passes `rate / clock` of its mass to the next.
 *
 * @param mass one entry a phase and a last one for what has left the chain.
 */
export function tick(chain: PhaseChain, mass: Float64Array): void {
  for (let i = chain.rates.length - 1; i >= 0; i--) {
    const moved = ((mass[i] ?? 0) * (chain.rates[i] ?? 0)) / chain.clock;
    mass[i] = (mass[i] ?? 0) - moved;
    mass[i + 1] = (mass[i + 1] ?? 0) + moved;
  }
}
