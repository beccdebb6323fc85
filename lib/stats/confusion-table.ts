/** Counts of pairs: rows are what the first reader said, columns the second, both in the order of the categories. */
export type ConfusionTable = readonly (readonly number[])[];

/**
 * Counts how often each word of the first reader met each word of the second.
 *
 * @param pairs one entry a thing that both have judged.
 * @param categories the words in the order of rows and columns.
 * @returns a square table of counts.
 * @throws RangeError for a word that is not among the categories.
 */
export function confusionTable<T>(pairs: readonly (readonly [T, T])[], categories: readonly T[]): number[][] {
  const place = new Map(categories.map((category, at) => [category, at]));
  const table = categories.map(() => categories.map(() => 0));
  for (const [first, second] of pairs) {
    const row = table[place.get(first) ?? -1];
    const column = place.get(second);
    if (!row || column === undefined) throw new RangeError(`not a category: ${String(first)} / ${String(second)}`);
    row[column] = (row[column] ?? 0) + 1;
  }
  return table;
}
