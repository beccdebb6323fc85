import type { ConfusionTable } from './confusion-table';

/** Sums of a table of two readers. */
export interface TableMargins {
  /** How often the first reader used each category. */
  rows: number[];
  /** How often the second reader did. */
  columns: number[];
  /** All pairs. */
  n: number;
}

/** Row sums, column sums and the total of a square table. */
export function tableMargins(table: ConfusionTable): TableMargins {
  const rows = table.map(() => 0);
  const columns = table.map(() => 0);
  let n = 0;
  table.forEach((row, i) => {
    row.forEach((count, j) => {
      rows[i] = (rows[i] ?? 0) + count;
      columns[j] = (columns[j] ?? 0) + count;
      n += count;
    });
  });
  return { rows, columns, n };
}
