import type { ConfusionTable } from './confusion-table';
import { tableMargins } from './table-margins';

/** How well two readers agree about one category. */
export interface ClassAgreement {
  /** Pairs in which both used it. */
  both: number;
  /** How often the first reader used it. */
  first: number;
  /** How often the second reader used it. */
  second: number;
  /** `2·both / (first + second)`: of all uses of the word, the share the other shared; null when nobody used it. */
  share: number | null;
}

/**
 * Agreement about each category on its own, in the order of the table. Kappa falls when one category is much more
 * common than the others, so this stands beside it.
 */
export function classAgreement(table: ConfusionTable): ClassAgreement[] {
  const { rows, columns } = tableMargins(table);
  return table.map((row, at) => {
    const both = row[at] ?? 0;
    const first = rows[at] ?? 0;
    const second = columns[at] ?? 0;
    return { both, first, second, share: first + second === 0 ? null : (2 * both) / (first + second) };
  });
}
