/** Probability of ending as a lost egg, a lost larva or lost capped brood; what is left of 1 comes out. */
export interface LossByStage {
  egg: number;
  larva: number;
  capped: number;
}

/** The whole probability of being lost. */
export function lossTotal({ egg, larva, capped }: LossByStage): number {
  return egg + larva + capped;
}
