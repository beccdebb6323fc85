import { type AlphaMetric, coincidenceAlpha } from './coincidence-alpha';
import type { ConfusionTable } from './confusion-table';
import { tableMargins } from './table-margins';

/**
 * Krippendorff's alpha of two readers who judged the same things: what `krippendorffAlpha` gives for the pairs behind
 * the table, without listing them.
 *
 * @param table counts of pairs; for `ordinal` the categories stand in their order.
 * @returns null where it is undefined.
 */
export function tableAlpha(table: ConfusionTable, metric: AlphaMetric): number | null {
  const { rows, columns, n } = tableMargins(table);
  return coincidenceAlpha(
    {
      values: rows.map((_, at) => at + 1),
      table: table.map((row, i) => row.map((count, j) => count + (table[j]?.[i] ?? 0))),
      totals: rows.map((count, at) => count + (columns[at] ?? 0)),
      n: 2 * n,
    },
    metric,
  );
}
