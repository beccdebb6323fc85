import { addDays, localDate } from '@/lib/kit/local-date';
import { startOfLocalDay } from './local-day';
import type { EmergenceDay } from './answer';
import { DAY_MS } from './date-range';
import { type TimeLaw, lawAt } from './time-law';

/** Equal broods at one value of the nest factor: when their adults come out. */
export interface BroodCount {
  law: TimeLaw;
  cells: number;
}

/** The broods of the comb at one value of the nest factor. */
export interface ForecastNode {
  weight: number;
  broods: readonly BroodCount[];
}

/** What the forecast runs over. */
interface ForecastFrame {
  /** The instant that the laws count days from, epoch milliseconds. */
  origin: number;
  asOf: number;
  zone: string;
  days: number;
}

/** Days since the origin. */
interface Span {
  from: number;
  to: number;
}

const NEGLIGIBLE = 1e-12;

/** Probability that one of these broods comes out alive within a span. */
function chanceOut({ law }: BroodCount, { from, to }: Span): number {
  return Math.max(0, lawAt(law, to) - lawAt(law, from));
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
function countsAt(broods: readonly BroodCount[], span: Span): number[] {
  return broods.reduce<number[]>(
    (counts, brood) => {
      const chance = chanceOut(brood, span);
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
function mixedCounts(nodes: readonly ForecastNode[], span: Span): number[] {
  const mixed: number[] = [];
  nodes.forEach(({ weight, broods }) => {
    countsAt(broods, span).forEach((mass, n) => {
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
  nodes: readonly ForecastNode[],
  { origin, asOf, zone, days }: ForecastFrame,
): EmergenceDay[] {
  const first = localDate(asOf, zone);
  const dates = Array.from({ length: days + 1 }, (_, i) => addDays(first, i));
  const bounds = dates.map((date) => (startOfLocalDay(date, zone) - origin) / DAY_MS);
  return dates.slice(0, days).map((date, i) => {
    const counts = mixedCounts(nodes, { from: bounds[i] ?? 0, to: bounds[i + 1] ?? 0 });
    const expected = counts.reduce((sum, mass, n) => sum + n * mass, 0);
    return { date, expected, lo80: countQuantile(counts, 0.1), hi80: countQuantile(counts, 0.9) };
  });
}
