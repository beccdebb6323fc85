import { fullDateWords } from './date-words';

/** `2026-06` → `June 2026`. */
export function monthWords(month: string): string {
  return fullDateWords(`${month}-01`).replace(/^1 /, '');
}
