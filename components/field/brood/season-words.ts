import type { Season } from '@/lib/brood/answer';

/** What the season means for a move. The programme's rules decide; this is the estimate's word only. */
export const SEASON_WORDS: Readonly<Record<Season, string>> = {
  green: 'Green: more than a week before the first adult.',
  amber: 'Amber: the last week before the first adult.',
  red: 'Red: adults are out, or due.',
  grey: 'Grey: nothing in the comb can be dated.',
};
