import type { ConfusionTable } from './confusion-table';
import { tableMargins } from './table-margins';

/** The parts kappa is made of, as shares. */
export interface KappaParts {
  /** (observed − expected) / (1 − expected). */
  value: number;
  /** Agreement expected by chance. */
  expected: number;
}

/**
 * Kappa with any weights of agreement, without its variance: what is worked out again for every draw of an interval.
 *
 * Source: Cohen 1968, Psychological Bulletin 70:213–220.
 *
 * @param table counts of two readers.
 * @param weights agreement weights, 1 for full agreement; see `agreementWeights`.
 * @returns null where kappa is undefined: nothing compared, or chance alone would agree on everything, as when both
 *   used one word throughout.
 */
export function kappaValue(table: ConfusionTable, weights: readonly (readonly number[])[]): KappaParts | null {
  const { rows, columns, n } = tableMargins(table);
  if (n === 0) return null;
  let observed = 0;
  let expected = 0;
  weights.forEach((row, i) => {
    row.forEach((weight, j) => {
      observed += (weight * (table[i]?.[j] ?? 0)) / n;
      expected += (weight * (rows[i] ?? 0) * (columns[j] ?? 0)) / (n * n);
    });
  });
  if (1 - expected < 1e-12) return null;
  return { value: (observed - expected) / (1 - expected), expected };
}
