import type { Timeline } from './timeline';

/** How many cells the comb has at a time, in days since the first look. */
export type CombCurve = (day: number) => number;

/** A counted visit. */
export interface CombCount {
  day: number;
  cells: number;
}

/** Least-squares slope of log cells on days. */
function logSlope(counts: readonly CombCount[]): number {
  const n = counts.length;
  const meanDay = counts.reduce((sum, { day }) => sum + day, 0) / n;
  const meanLog = counts.reduce((sum, { cells }) => sum + Math.log(cells), 0) / n;
  const cross = counts.reduce((sum, { day, cells }) => sum + (day - meanDay) * (Math.log(cells) - meanLog), 0);
  const square = counts.reduce((sum, { day }) => sum + (day - meanDay) ** 2, 0);
  return square > 0 ? cross / square : 0;
}

/** The part before the first count: log-linear where three or more counts give a slope, else so many cells a day. */
function before(counts: readonly CombCount[], perDay: number): CombCurve {
  const first = counts[0] ?? { day: 0, cells: 1 };
  const slope = counts.length >= 3 ? logSlope(counts) : 0;
  return slope > 0
    ? (day) => first.cells * Math.exp(slope * (day - first.day))
    : (day) => first.cells + perDay * (day - first.day);
}

/**
 * The comb's growth: straight between counts (a comb never loses cells), after the last one as many as then, before
 * the first as `perDay` says, or as three or more counts say.
 *
 * @param counted in order of time, at least one cell each.
 */
export function combCurve(counted: readonly CombCount[], perDay: number): CombCurve {
  let most = 1;
  const counts = counted.map(({ day, cells }) => ({ day, cells: (most = Math.max(most, cells)) }));
  const early = before(counts, perDay);
  return (day) => {
    const next = counts.findIndex((count) => count.day > day);
    const low = counts[next < 0 ? counts.length - 1 : next - 1];
    const high = counts[next];
    if (!low) return early(day);
    if (!high) return low.cells;
    return low.cells + ((high.cells - low.cells) * (day - low.day)) / (high.day - low.day);
  };
}

/** When a cell was built, as known from its place: probabilities by step, given that it was not there at the start. */
export interface BuildingPrior {
  key: string;
  /** Probability of being built in each step of the timeline. */
  mass: Float64Array;
  /** Probability of not being there yet, at each edge of the timeline. */
  absent: Float64Array;
}

/** log(1 + eˣ) without overflow. */
function softplus(x: number): number {
  return x > 30 ? x : Math.log1p(Math.exp(x));
}

/** What is known of a cell from its place. */
export interface CellPlace {
  /** By distance from the pedicel cell, equal distances sharing the middle rank. */
  rank: number;
  /** Scale of the logistic law, in cells. */
  spread: number;
  /** Share of cells that follow no order: built on any day alike. */
  slip: number;
}

/** Prior law of the time a cell was built: logistic in how far the comb had grown past the cell's rank. */
export function buildingPrior({ edges }: Timeline, curve: CombCurve, { rank, spread, slip }: CellPlace): BuildingPrior {
  const hazard = edges.map((day) => softplus((curve(day) - rank + 0.5) / spread));
  const start = hazard[0] ?? 0;
  let most = start;
  const ordered = hazard.map((value) => Math.exp(start - (most = Math.max(most, value))));
  const [from, to] = [edges[0] ?? 0, edges.at(-1) ?? 0];
  const absent = ordered.map((p, i) => (1 - slip) * p + slip * (1 - ((edges[i] ?? 0) - from) / (to - from)));
  const mass = Float64Array.from({ length: edges.length - 1 }, (_, i) => (absent[i] ?? 0) - (absent[i + 1] ?? 0));
  return { key: `${rank}`, mass, absent };
}

/** Ranks of cells by distance, equal distances sharing the middle of their places. */
export function midRanks(distances: readonly number[]): number[] {
  const sorted = [...distances].sort((a, b) => a - b);
  return distances.map((distance) => {
    const below = sorted.findIndex((other) => other > distance - 1e-9);
    const upTo = sorted.findLastIndex((other) => other < distance + 1e-9);
    return (below + upTo) / 2 + 1;
  });
}
