import { localDate } from '@/lib/kit/local-date';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { BroodEstimate, CellEstimate, DateRange } from './answer';
import { type CellLook, cellLooks } from './cell-looks';
import type { BroodReading } from './input';

/** An event a range was given for. */
export type BroodEvent = 'capped' | 'emerges';

/** What later readings showed of one cell's event. Days are local dates of the nest. */
export type EventSeen =
  /** It came about on one of the days from `from` to `to`: the day before it was seen, to the day it was. */
  | { kind: 'between'; from: string; to: string }
  /** Not yet at the last look. */
  | { kind: 'not-yet' }
  /** It can't be told: the brood was lost, or the cell changed hands unseen. */
  | { kind: 'lost' };

/** A range given at an earlier visit, beside what came about. */
export interface CheckedRange extends Axial {
  event: BroodEvent;
  predicted: DateRange;
  seen: EventSeen;
  /** The last day anybody looked into the cell. */
  lookedUntil: string;
}

/** How many ranges of one width could be checked, and how they stood. */
export interface RangeCount {
  /** Ranges that had run out by the last look, so that early and late both show. */
  n: number;
  /** Every day the event can have been lies in the range. */
  inside: number;
  /** Some of these days do, some don't. */
  either: number;
}

/** The counts of one event for the three widths. */
export interface EventCounts {
  event: BroodEvent;
  p50: RangeCount;
  p80: RangeCount;
  p95: RangeCount;
  /** Cells whose brood was lost before, or whose event cannot be told. */
  lost: number;
}

const YOUNGER: readonly CellState[] = ['small', 'medium', 'large'];

/** Is this a look at the same brood, still open? A larva may be read a class too small, an egg after a larva may not. */
function isStillOpen(state: CellState, hatched: boolean): boolean {
  return YOUNGER.includes(state) || (state === 'egg' && !hatched);
}

/** The looks into one cell around an estimate: the last one it knew, and those that came later. */
interface LooksAround {
  known: CellLook;
  later: readonly CellLook[];
  zone: string;
}

/** What later looks say of both events. */
function eventsSeen({ known, later, zone }: LooksAround): Record<BroodEvent, EventSeen> {
  const seen: Record<BroodEvent, EventSeen> = { capped: { kind: 'not-yet' }, emerges: { kind: 'not-yet' } };
  let before = localDate(known.at, zone);
  let hatched = known.state !== 'egg';
  let isCapped = known.state === 'capped';
  for (const { at, state } of later) {
    const day = localDate(at, zone);
    const between: EventSeen = { kind: 'between', from: before, to: day };
    if (state === 'capped') {
      if (!isCapped) seen.capped = between;
      isCapped = true;
    } else if (state === 'opened') {
      return { capped: isCapped ? seen.capped : between, emerges: between };
    } else if (isCapped || !isStillOpen(state, hatched)) {
      return { capped: isCapped ? seen.capped : { kind: 'lost' }, emerges: { kind: 'lost' } };
    } else if (state !== 'egg') hatched = true;
    before = day;
  }
  return seen;
}

function checksOf({ q, r, laid, capped, emerges }: CellEstimate, looks: LooksAround): CheckedRange[] {
  const last = looks.later.at(-1);
  if (!last || !laid) return [];
  const seen = eventsSeen(looks);
  const lookedUntil = localDate(last.at, looks.zone);
  const check = (event: BroodEvent, predicted: DateRange | null): CheckedRange[] =>
    predicted ? [{ q, r, event, predicted, seen: seen[event], lookedUntil }] : [];
  return [...check('capped', looks.known.state === 'capped' ? null : capped), ...check('emerges', emerges)];
}

/**
 * Lays the ranges of an earlier estimate beside what later readings showed.
 *
 * @param estimate as known then.
 * @param readings all readings of the nest, also later ones.
 */
export function whatHappened(estimate: BroodEstimate, readings: readonly BroodReading[]): CheckedRange[] {
  const asOf = Date.parse(estimate.asOf);
  const looks = cellLooks(readings);
  return estimate.cells.flatMap((cell) => {
    const own = looks.get(cellKey(cell)) ?? [];
    const known = own.findLast(({ at }) => at <= asOf);
    const later = own.filter(({ at }) => at > asOf);
    return known ? checksOf(cell, { known, later, zone: estimate.zone }) : [];
  });
}

function countRange(checks: readonly CheckedRange[], width: 'p50' | 'p80' | 'p95'): RangeCount {
  const count: RangeCount = { n: 0, inside: 0, either: 0 };
  for (const { seen, predicted, lookedUntil } of checks) {
    const [lo, hi] = predicted[width];
    // A range that reaches past the last look is left out whatever was seen: counting only its early half would flatter.
    if (seen.kind === 'lost' || hi > lookedUntil) continue;
    count.n += 1;
    if (seen.kind === 'not-yet' || seen.to < lo || seen.from > hi) continue;
    if (seen.from >= lo && seen.to <= hi) count.inside += 1;
    else count.either += 1;
  }
  return count;
}

/** Counts how often the event lay in the ranges, event by event and width by width. */
export function countHits(checks: readonly CheckedRange[]): EventCounts[] {
  return (['capped', 'emerges'] as const).map((event) => {
    const own = checks.filter((check) => check.event === event);
    return {
      event,
      p50: countRange(own, 'p50'),
      p80: countRange(own, 'p80'),
      p95: countRange(own, 'p95'),
      lost: own.filter(({ seen }) => seen.kind === 'lost').length,
    };
  });
}
