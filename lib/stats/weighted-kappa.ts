import type { ConfusionTable } from './confusion-table';
import { kappaValue } from './kappa-value';
import { tableMargins } from './table-margins';

/** Kappa and its large-sample variances. */
export interface Kappa {
  value: number;
  /** Variance of the estimate, for an interval. */
  variance: number;
  /** Variance if the two were independent, for a test against zero. */
  varianceAtZero: number;
  /** Pairs compared. */
  n: number;
}

/** The sum over all fields of the table of what `term` gives for row `i` and column `j`. */
function overTable(size: number, term: (i: number, j: number) => number): number {
  let total = 0;
  for (let i = 0; i < size; i += 1) for (let j = 0; j < size; j += 1) total += term(i, j);
  return total;
}

/** Mean weight of each line of the table, given how often the other reader used each category. */
function meanWeights(shares: readonly number[], weight: (line: number, other: number) => number): number[] {
  return shares.map((_, line) => shares.reduce((sum, share, other) => sum + share * weight(line, other), 0));
}

/**
 * Cohen's kappa with any weights of agreement, and its variances.
 *
 * Source: Cohen 1968 (Psychological Bulletin 70:213–220) for the value; Fleiss, Cohen & Everitt 1969 (Psychological
 * Bulletin 72:323–327) for both variances.
 *
 * @param table counts of two readers.
 * @param weights agreement weights, 1 for full agreement; see `agreementWeights`.
 * @returns null where kappa is undefined; see `kappaValue`.
 */
export function weightedKappa(table: ConfusionTable, weights: readonly (readonly number[])[]): Kappa | null {
  const parts = kappaValue(table, weights);
  if (!parts) return null;
  const { value, expected } = parts;
  const { rows, columns, n } = tableMargins(table);
  const rowShares = rows.map((count) => count / n);
  const columnShares = columns.map((count) => count / n);
  const w = (i: number, j: number) => weights[i]?.[j] ?? 0;
  const p = (i: number, j: number) => (table[i]?.[j] ?? 0) / n;
  const chance = (i: number, j: number) => (rowShares[i] ?? 0) * (columnShares[j] ?? 0);
  const rowMeans = meanWeights(columnShares, w);
  const columnMeans = meanWeights(rowShares, (line, other) => w(other, line));
  const mean = (i: number, j: number) => (rowMeans[i] ?? 0) + (columnMeans[j] ?? 0);
  const divisor = n * (1 - expected) ** 2;
  const spread = overTable(table.length, (i, j) => p(i, j) * (w(i, j) - mean(i, j) * (1 - value)) ** 2);
  const spreadAtZero = overTable(table.length, (i, j) => chance(i, j) * (w(i, j) - mean(i, j)) ** 2);
  return {
    value,
    variance: Math.max(0, (spread - (value - expected * (1 - value)) ** 2) / divisor),
    varianceAtZero: Math.max(0, (spreadAtZero - expected ** 2) / divisor),
    n,
  };
}
