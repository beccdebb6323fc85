/** More cells than any comb the product takes has been seen to hold. */
const MOST_CELLS = 2_000;

/** Reads a number of cells as typed: a whole number from 1; anything else means not counted. */
export function readCount(text: string): number | null {
  const trimmed = text.trim();
  if (!/^\d{1,6}$/.test(trimmed)) return null;
  const count = Number(trimmed);
  return count >= 1 ? Math.min(count, MOST_CELLS) : null;
}
