import type { CellPair } from './compare-cells';
import type { ReviewSettings } from './review-settings';

/** How far two readings of one comb agree, as counts. */
export interface CombAgreement {
  /** Cells both read. */
  compared: number;
  alike: number;
  /** Cells that one of them has no mark for, or could not tell. */
  leftOut: number;
  clashes: number;
}

/** Who may settle what two readers see differently. */
export type Settler = 'reviewer' | 'lead';

/** Counts what two readings have in common. */
export function countAgreement(pairs: readonly CellPair[]): CombAgreement {
  const alike = pairs.filter(({ standing }) => standing === 'alike').length;
  const differing = pairs.filter(({ standing }) => standing === 'differs').length;
  const compared = alike + differing;
  return { compared, alike, leftOut: pairs.length - compared, clashes: pairs.filter(({ clash }) => clash).length };
}

/** Rounding of a share such as 0.9 must not decide. */
const SLACK = 1e-9;

/**
 * Who may settle: a reviewer alone where enough cells are read alike and no more of them clash than the settings
 * allow; otherwise the lead biologist, as third reader. Two readings with no cell in common go to the lead biologist.
 */
export function settlerOf(agreement: CombAgreement, settings: ReviewSettings): Settler {
  const { compared, alike, clashes } = agreement;
  if (compared === 0 || clashes > settings.reviewClashes) return 'lead';
  return alike + SLACK >= settings.reviewAgreement * compared ? 'reviewer' : 'lead';
}
