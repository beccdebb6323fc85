import type { Coincidences } from './coincidences';

/** How far apart two values are held to be. */
export type AlphaMetric = 'nominal' | 'ordinal' | 'interval' | 'ratio';

function ordinalDistance({ totals }: Coincidences, i: number, j: number): number {
  let between = 0;
  for (let at = Math.min(i, j); at <= Math.max(i, j); at += 1) between += totals[at] ?? 0;
  return between - ((totals[i] ?? 0) + (totals[j] ?? 0)) / 2;
}

function distance(seen: Coincidences, metric: AlphaMetric): (i: number, j: number) => number {
  const value = (at: number) => seen.values[at] ?? 0;
  switch (metric) {
    case 'nominal':
      return (i, j) => (i === j ? 0 : 1);
    case 'ordinal':
      return (i, j) => ordinalDistance(seen, i, j);
    case 'interval':
      return (i, j) => value(i) - value(j);
    case 'ratio':
      return (i, j) => (i === j ? 0 : (value(i) - value(j)) / (value(i) + value(j)));
  }
}

/**
 * Krippendorff's alpha from a table of coincidences.
 *
 * Source: Krippendorff 2011, Computing Krippendorff's Alpha-Reliability.
 *
 * @returns null where it is undefined: nothing was judged twice, or all judgements are one value.
 */
export function coincidenceAlpha(seen: Coincidences, metric: AlphaMetric): number | null {
  const apart = distance(seen, metric);
  let observed = 0;
  let expected = 0;
  seen.table.forEach((row, i) => {
    row.forEach((count, j) => {
      const squared = apart(i, j) ** 2;
      observed += count * squared;
      expected += ((seen.totals[i] ?? 0) * (seen.totals[j] ?? 0) * squared) / (seen.n - 1);
    });
  });
  return expected > 0 ? 1 - observed / expected : null;
}
