/** How much credit a near miss gets. */
export type Weighting = 'none' | 'linear' | 'quadratic';

function credit(distance: number, weighting: Weighting): number {
  if (weighting === 'none') return distance === 0 ? 1 : 0;
  return 1 - (weighting === 'linear' ? distance : distance ** 2);
}

/**
 * Weights of agreement for ordered categories: 1 on the diagonal, 0 in the far corners.
 * `linear` is 1 − |i−j|/(k−1), `quadratic` 1 − ((i−j)/(k−1))², `none` counts only equal words.
 *
 * Source: Cohen 1968, Psychological Bulletin 70:213–220.
 *
 * @param size number of categories.
 */
export function agreementWeights(size: number, weighting: Weighting): number[][] {
  const places = Array.from({ length: size }, (_, at) => at);
  const widest = Math.max(1, size - 1);
  return places.map((i) => places.map((j) => credit(Math.abs(i - j) / widest, weighting)));
}
