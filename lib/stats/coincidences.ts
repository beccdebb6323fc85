/** What each reader said about one thing, as numbers in the order of the categories; null where one said nothing. */
export type Unit = readonly (number | null)[];

/** How often values met within units. */
export interface Coincidences {
  /** The values that occur, ascending. */
  values: number[];
  /** Weighted counts of ordered pairs, in that order. */
  table: number[][];
  /** Row sums: how often each value can be paired. */
  totals: number[];
  /** All pairable values. */
  n: number;
}

function countUnit(table: number[][], said: readonly number[]): void {
  said.forEach((one, i) => {
    said.forEach((other, j) => {
      const row = table[one];
      if (i !== j && row) row[other] = (row[other] ?? 0) + 1 / (said.length - 1);
    });
  });
}

/**
 * The coincidence table behind Krippendorff's alpha: each unit judged by m ≥ 2 readers gives its ordered pairs,
 * weighted by 1/(m−1); units with one judgement or none pair with nothing.
 *
 * Source: Krippendorff 2011, Computing Krippendorff's Alpha-Reliability.
 */
export function coincidences(units: readonly Unit[]): Coincidences {
  const paired = units.map((unit) => unit.filter((value) => value !== null)).filter((said) => said.length > 1);
  const values = [...new Set(paired.flat())].sort((a, b) => a - b);
  const place = new Map(values.map((value, at) => [value, at]));
  const table = values.map(() => values.map(() => 0));
  for (const said of paired)
    countUnit(
      table,
      said.map((value) => place.get(value) ?? 0),
    );
  const totals = table.map((row) => row.reduce((sum, count) => sum + count, 0));
  return { values, table, totals, n: totals.reduce((sum, count) => sum + count, 0) };
}
