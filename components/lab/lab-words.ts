import { countWords } from '@/components/ui/date-words';
import type { Season } from '@/lib/brood/answer';
import type { PlaceView } from './lab-shapes';

/** How far the work on a nest can have come, with what it is called. */
export const NEST_STATE_WORDS = {
  new: 'not read yet',
  reading: 'being read',
  submitted: 'handed in',
  settled: 'settled',
  locked: 'locked',
  archived: 'put away',
} as const;

/** How far the work on a nest has come. */
export type NestState = keyof typeof NEST_STATE_WORDS;

/** Is this one of the states of a nest? */
export function isNestState(text: string): text is NestState {
  return Object.hasOwn(NEST_STATE_WORDS, text);
}

/** The word under a name in a table of words; the name itself when the table has none. */
function wordIn(table: Readonly<Record<string, string>>, name: string): string {
  return table[name] ?? name;
}

/** What a visit was for: `Take-down`. */
export function purposeWords(purpose: string): string {
  return wordIn({ 'take-down': 'Take-down', check: 'Check', lab: 'Lab', other: 'Visit' }, purpose);
}

/** What a reading is: `field reading`. */
export function kindWords(kind: string): string {
  return wordIn({ field: 'field reading', second: 'second reading', final: 'final reading' }, kind);
}

/** Where the states of a reading were seen: `at the comb`. */
export function sourceWords(source: string): string {
  return wordIn({ phone: 'at the comb', paper: 'from paper', photo: 'from a photo' }, source);
}

/** How far a reading has come: open, handed in, or locked with its version. */
export function readingStanding(reading: { submittedAt: string | null; lockedVersion: number | null }): string {
  if (reading.lockedVersion !== null) return `locked, version ${reading.lockedVersion}`;
  return reading.submittedAt === null ? 'still open' : 'handed in';
}

/** The season gate in words: the colour's name first, then what it means for moving the nest. */
export const SEASON_WORDS: Readonly<Record<Season, string>> = {
  green: 'green: more than seven days before the first adult',
  amber: 'amber: the last seven days before the first adult',
  red: 'red: adults are out or due. Leave her where she is.',
  grey: 'grey: nothing in this comb can be dated',
};

function degrees(value: number, [positive, negative]: readonly [string, string], digits: number): string {
  return `${Math.abs(value).toFixed(digits)}° ${value < 0 ? negative : positive}`;
}

/** A point in words: `43.59800° N, 77.60500° W`; a rounded one as the grid square it lies in. */
export function pointWords({ lat, lon }: PlaceView, rounded: boolean): string {
  const digits = rounded ? 2 : 5;
  const point = `${degrees(lat, ['N', 'S'], digits)}, ${degrees(lon, ['E', 'W'], digits)}`;
  return rounded ? `${point}: the grid square of about 1 km it lies in` : point;
}

/**
 * Where a nest hung, in words: exact with its accuracy, or as a grid square when it was rounded for the reader.
 *
 * @param rounded true when the reader is shown the grid square only.
 */
export function placeWords(place: PlaceView, rounded: boolean): string {
  const point = pointWords(place, rounded);
  if (rounded) return point;
  const { accuracyM } = place;
  return typeof accuracyM === 'number'
    ? `${point}, within ${countWords(Math.round(accuracyM), 'metre')}`
    : `${point}, accuracy not recorded`;
}

/** A nest in one line for titles of pages: `N12 Bandstand roof`. */
export function nestLine({ code, name }: { code: string; name: string | null }): string {
  return name ? `${code} ${name}` : code;
}
