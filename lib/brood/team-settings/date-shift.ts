import { daysBetween } from '@/lib/kit/local-date';
import type { BroodEstimate, DateRange } from '@/lib/brood/answer';

/** How far one date of a nest would move. */
export interface DateShift {
  /** Medians, `YYYY-MM-DD`; null where there is none. */
  before: string | null;
  after: string | null;
  /** Whole days; negative is earlier, null when one of the two is missing. */
  days: number | null;
}

function shift(before: DateRange | null, after: DateRange | null): DateShift {
  const days = before && after ? daysBetween(before.median, after.median) : null;
  return { before: before?.median ?? null, after: after?.median ?? null, days };
}

/** How a nest's founding and first emergence move from one estimate to another of the same readings. */
export function dateShifts(
  before: BroodEstimate,
  after: BroodEstimate,
): { founded: DateShift; firstEmergence: DateShift } {
  return {
    founded: shift(before.nest.founded, after.nest.founded),
    firstEmergence: shift(before.nest.firstEmergence, after.nest.firstEmergence),
  };
}
