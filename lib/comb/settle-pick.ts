/**
 * Whose view a decision about one cell takes: the field reader's, the lab reader's, a third state, that nobody can
 * tell, or that there is no cell at all.
 */
export const SETTLE_PICKS = ['field', 'lab', 'third', 'unsure', 'none'] as const;

/** One of the five ways to settle a cell. */
export type SettlePick = (typeof SETTLE_PICKS)[number];

/** Is this one of the ways to settle a cell? */
export function isSettlePick(value: unknown): value is SettlePick {
  return typeof value === 'string' && (SETTLE_PICKS as readonly string[]).includes(value);
}
