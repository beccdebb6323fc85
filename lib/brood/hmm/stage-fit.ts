/** A stage as a row of equal phases of which the first is skipped with some probability. */
export interface PhaseStage {
  name: string;
  phases: number;
  /** Rate of leaving each phase, per day of the development clock. */
  rate: number;
  /** Probability that a brood entering the stage starts in its second phase. */
  skipFirst: number;
  /** Loss while in the stage, per calendar day. */
  lossPerDay: number;
}

/** A plain Erlang stage. */
export function erlangStage(phases: number, meanDays: number): Pick<PhaseStage, 'phases' | 'rate' | 'skipFirst'> {
  return { phases, rate: phases / meanDays, skipFirst: 0 };
}

/**
 * The mixture of Erlang(k − 1) and Erlang(k) with one rate that has exactly this mean and coefficient of variation
 * (Tijms 1994).
 *
 * @param cv above 0 and at most 1.
 */
export function twoMomentStage(meanDays: number, cv: number): Pick<PhaseStage, 'phases' | 'rate' | 'skipFirst'> {
  const square = cv * cv;
  const phases = Math.ceil(1 / square - 1e-9);
  const root = Math.sqrt(Math.max(0, phases * (1 + square) - phases * phases * square));
  const skipFirst = Math.max(0, (phases * square - root) / (1 + square));
  return { phases, rate: (phases - skipFirst) / meanDays, skipFirst };
}
