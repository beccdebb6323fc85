import { countWords } from '@/components/ui/date-words';
import { STATE_WORDS } from '@/lib/comb/states';
import type { SettlePick } from '@/lib/comb/settle-pick';
import type { Interval } from '@/lib/stats/interval';
import type { SeenView } from './review-shapes';

/** What a visit can wait for in the lab, with what it is called in the queue. */
export const WAITS_WORDS = {
  second: 'a second reader',
  reading: 'the second reader to finish',
  reviewer: 'a reviewer to settle',
  lead: 'the lead biologist to settle',
  lock: 'somebody to lock it',
  'later-marks': 'somebody to look: marks came after the lock',
} as const;

/** Whose view a decision takes, in words. */
export const PICK_WORDS: Readonly<Record<SettlePick, string>> = {
  field: 'field',
  lab: 'lab',
  third: 'a third state',
  unsure: 'nobody can tell',
  none: 'no cell there',
};

/** What a reader saw: `small larva, unsure`; `no cell` where there is none. */
export function seenWords(seen: SeenView | null): string {
  if (!seen) return 'no cell';
  return seen.unsure ? `${STATE_WORDS[seen.state]}, unsure` : STATE_WORDS[seen.state];
}

/** A figure of agreement to four places, or that there is none. */
export function figureWords(value: number | null): string {
  return value === null ? 'none' : value.toFixed(4);
}

/** An interval: `0.72 to 0.97`; nothing where there is none. */
export function intervalWords(interval: Interval | null): string {
  return interval ? `${interval.low.toFixed(2)} to ${interval.high.toFixed(2)}` : '';
}

/** Days with one place: `1.5 days`. */
export function daysWords(days: number): string {
  return `${days.toFixed(1)} days`;
}

/** Cells that took no part, and why: `2 cells left out, because …`. */
export function leftOutWords(count: number): string {
  if (count === 0) return 'no cell is left out';
  return `${countWords(count, 'cell')} left out, because one reader has no such cell or could not tell`;
}
