/** The twelve words for what a cell holds, in the order every list and table uses. */
export const CELL_STATES = [
  'unread',
  'empty',
  'egg',
  'small',
  'medium',
  'large',
  'capped',
  'opened',
  'dead',
  'parasitised',
  'webbed',
  'damaged',
] as const;

/** What one cell was seen to hold. */
export type CellState = (typeof CELL_STATES)[number];

/** The six states that have a large key of their own. */
export const EVERYDAY_STATES = [
  'empty',
  'egg',
  'small',
  'medium',
  'large',
  'capped',
] as const satisfies readonly CellState[];

/** The states behind the *more* key. */
export const FURTHER_STATES = [
  'opened',
  'dead',
  'parasitised',
  'webbed',
  'damaged',
  'unread',
] as const satisfies readonly CellState[];

/** Is this one of the twelve state words? */
export function isCellState(value: unknown): value is CellState {
  return typeof value === 'string' && (CELL_STATES as readonly string[]).includes(value);
}

/** The words a person reads: `small` alone is short for `small larva`. */
export const STATE_WORDS: Readonly<Record<CellState, string>> = {
  unread: 'unread',
  empty: 'empty',
  egg: 'egg',
  small: 'small larva',
  medium: 'medium larva',
  large: 'large larva',
  capped: 'capped',
  opened: 'opened',
  dead: 'dead',
  parasitised: 'parasitised',
  webbed: 'webbed',
  damaged: 'damaged',
};

/**
 * The letters of the paper field sheet, which also work as keyboard keys.
 * A blank on paper is `unread`; on a keyboard that is `u`.
 */
export const STATE_LETTERS: Readonly<Record<CellState, string>> = {
  unread: 'u',
  empty: '-',
  egg: 'o',
  small: 's',
  medium: 'm',
  large: 'l',
  capped: 'c',
  opened: 'h',
  dead: 'x',
  parasitised: 'p',
  webbed: 'w',
  damaged: 'd',
};
