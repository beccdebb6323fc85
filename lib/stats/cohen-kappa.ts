import { agreementWeights } from './agreement-weights';
import type { ConfusionTable } from './confusion-table';
import { type Kappa, weightedKappa } from './weighted-kappa';

/**
 * Cohen's kappa of two readers over unordered categories.
 *
 * @returns null where it is undefined: nothing compared, or both used one word throughout.
 */
export function cohenKappa(table: ConfusionTable): Kappa | null {
  return weightedKappa(table, agreementWeights(table.length, 'none'));
}
