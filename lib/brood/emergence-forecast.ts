import { addDays, localDate } from '@/lib/kit/local-date';
import type { EmergenceDay } from './answer';
import type { BroodSighting } from './cell-history';
import type { ClassLaw } from './class-law';
import { cdfAt } from './day-law';
import { DAY_MS } from './date-range';
import { startOfLocalDay } from './local-day';
import { lossTotal } from './losses';
import type { FactorNode } from './nest-factor';

/** Equal broods counted together. */
export interface BroodCount {
  brood: BroodSighting;
  law: ClassLaw;
  cells: number;
}

/** What the forecast runs over. */
interface ForecastFrame {
  nodes: readonly FactorNode[];
  asOf: number;
  zone: string;
  days: number;
}

const NEGLIGIBLE = 1e-12;

/** Probability that one of these broods comes out alive between two instants, for one value of the nest factor. */
function chanceOut({ brood, law }: BroodCount, node: number, span: { from: number; to: number }): number {
  const cdf = law.untilOut.byNode[node];
  const losses = law.losses[node];
  if (!cdf || !losses) return 0;
  const within = cdfAt(cdf, (span.to - brood.at) / DAY_MS) - cdfAt(cdf, (span.from - brood.at) / DAY_MS);
  return within * (1 - lossTotal(losses));
}

/** Adds independent cells to the distribution of a count, one by one; far tails are dropped. */
function addCells(counts: number[], chance: number, cells: number): number[] {
  let sum = counts;
  for (let cell = 0; cell < cells; cell++) {
    const next = [...sum, 0].map((mass, n) => mass * (1 - chance) + (sum[n - 1] ?? 0) * chance);
    while (next.length > 1 && (next.at(-1) ?? 0) < NEGLIGIBLE) next.pop();
    sum = next;
  }
  return sum;
}

/** Distribution of the number of adults within a span, for one value of the nest factor. */
function countsAt(broods: readonly BroodCount[], node: number, span: { from: number; to: number }): number[] {
  return broods.reduce<number[]>(
    (counts, brood) => {
      const chance = chanceOut(brood, node, span);
      return chance < NEGLIGIBLE ? counts : addCells(counts, chance, brood.cells);
    },
    [1],
  );
}

/** The smallest count that is reached with probability `p`. */
function countQuantile(counts: readonly number[], p: number): number {
  let sum = 0;
  for (const [n, mass] of counts.entries()) {
    sum += mass;
    if (sum >= p) return n;
  }
  return counts.length - 1;
}

/** Mixes the counts over the nest factor: given the factor, cells are independent of each other. */
function mixedCounts(
  broods: readonly BroodCount[],
  nodes: readonly FactorNode[],
  span: { from: number; to: number },
): number[] {
  const mixed: number[] = [];
  nodes.forEach(({ weight }, node) => {
    countsAt(broods, node, span).forEach((mass, n) => {
      mixed[n] = (mixed[n] ?? 0) + weight * mass;
    });
  });
  return mixed;
}

/**
 * Adults to expect on each local day from `asOf` on, with an 80 % band from the exact distribution of the count
 * (cells independent given the nest factor, then mixed over it).
 */
export function emergenceForecast(
  broods: readonly BroodCount[],
  { nodes, asOf, zone, days }: ForecastFrame,
): EmergenceDay[] {
  const first = localDate(asOf, zone);
  const dates = Array.from({ length: days + 1 }, (_, i) => addDays(first, i));
  const bounds = dates.map((date) => startOfLocalDay(date, zone));
  return dates.slice(0, days).map((date, i) => {
    const counts = mixedCounts(broods, nodes, { from: bounds[i] ?? 0, to: bounds[i + 1] ?? 0 });
    const expected = counts.reduce((sum, mass, n) => sum + n * mass, 0);
    return { date, expected, lo80: countQuantile(counts, 0.1), hi80: countQuantile(counts, 0.9) };
  });
}
