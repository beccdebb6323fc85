import { countWords } from '@/components/ui/date-words';
import type { CellChange, Surprise } from '@/lib/brood/surprising-change';
import { STATE_WORDS } from '@/lib/comb/states';

/** How long ago the last visit was: `the same day`, `2 days ago`. */
function sinceWords(days: number): string {
  const whole = Math.round(days);
  return whole === 0 ? 'less than a day ago' : `${countWords(whole, 'day')} ago`;
}

/** What was seen at both visits: `Capped 2 days ago, egg now.` */
export function changeWords({ from, to, days }: CellChange): string {
  const earlier = STATE_WORDS[from];
  return `${earlier.charAt(0).toUpperCase()}${earlier.slice(1)} ${sinceWords(days)}, ${STATE_WORDS[to]} now.`;
}

/** Why that is asked about. */
export const SURPRISE_WORDS: Readonly<Record<Surprise, string>> = {
  younger: 'The brood before it hardly had the time to be gone and another to take its place.',
  fast: 'That is further on than brood usually comes in this time.',
};
