import type { BroodEstimate, CellEstimate, DateRange } from './answer';

/** How far apart two readings of one comb are in time. */
export interface LayingDifference {
  /** Cells whose brood both readings date. */
  cells: number;
  /** Median of the absolute differences of the estimated laying dates, in days; null without such a cell. */
  medianDays: number | null;
  /** The largest of them, in days. */
  largestDays: number | null;
  /** Difference by cell, `"q,r"`, first minus second, in days; only cells both date. */
  byCell: Record<string, number>;
}

const DAY_MS = 86_400_000;

function laidAt({ laid }: CellEstimate): number | null {
  return laid && Date.parse(laid.utc.median);
}

/** The latest brood of each cell that can be dated. */
function layingDates({ cells }: BroodEstimate): Map<string, number> {
  const dates = new Map<string, number>();
  for (const cell of cells) {
    const at = laidAt(cell);
    if (at !== null) dates.set(`${cell.q},${cell.r}`, at);
  }
  return dates;
}

function median(sorted: readonly number[]): number | null {
  const middle = (sorted.length - 1) / 2;
  const [low, high] = [sorted[Math.floor(middle)], sorted[Math.ceil(middle)]];
  return low === undefined || high === undefined ? null : (low + high) / 2;
}

/** Compares two estimates of one nest, each made from another reading of the same visit. */
export function layingDifference(first: BroodEstimate, second: BroodEstimate): LayingDifference {
  const others = layingDates(second);
  const byCell: Record<string, number> = {};
  for (const [key, at] of layingDates(first)) {
    const other = others.get(key);
    if (other !== undefined) byCell[key] = (at - other) / DAY_MS;
  }
  const apart = Object.values(byCell)
    .map(Math.abs)
    .sort((a, b) => a - b);
  return { cells: apart.length, medianDays: median(apart), largestDays: apart.at(-1) ?? null, byCell };
}

/** The dates of a whole nest as one reading gives them; null where nothing can be dated. */
export interface NestDates {
  founded: DateRange | null;
  firstEmergence: DateRange | null;
}

/** The dates of the nest in an estimate. */
export function nestDates({ nest: { founded, firstEmergence } }: BroodEstimate): NestDates {
  return { founded, firstEmergence };
}
