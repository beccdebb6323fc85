import { countWords, dateWords, spanWords } from '@/components/ui/date-words';
import type { BroodEvent, CheckedRange, EventCounts, EventSeen, RangeCount } from '@/lib/brood/what-happened';
import { cellNumber } from '@/lib/comb/walk';

/** What an event is called. */
export const EVENT_WORDS: Readonly<Record<BroodEvent, string>> = { capped: 'capped', emerges: 'adult came out' };

/** How many of the checked ranges held: `6 of 9`, `5 to 7 of 9` where the days seen lie across an end. */
export function hitWords({ n, inside, either }: RangeCount): string {
  if (n === 0) return 'none has run out yet';
  return either === 0 ? `${inside} of ${n}` : `${inside} to ${inside + either} of ${n}`;
}

/** What later readings showed of an event. */
export function seenWords(seen: EventSeen, lookedUntil: string, year: string): string {
  if (seen.kind === 'lost') return 'cannot be told: the brood was gone';
  if (seen.kind === 'not-yet') return `not yet on ${dateWords(lookedUntil, year)}`;
  return seen.from === seen.to ? dateWords(seen.to, year) : `between ${spanWords([seen.from, seen.to], year)}`;
}

/** Is there anything at all to show for a visit? */
export function hasChecks(counts: readonly EventCounts[]): boolean {
  return counts.some(({ p50, p80, p95, lost }) => p50.n + p80.n + p95.n + lost > 0);
}

/** How many cells are left out of the counts, in words; blank when none are. */
export function lostWords(counts: readonly EventCounts[]): string {
  const lost = Math.max(0, ...counts.map((count) => count.lost));
  return lost === 0 ? '' : `${countWords(lost, 'cell')} left out: the brood was gone before.`;
}

/** One line of the list of checks: cells with the same range and the same sight together. */
export interface CheckLine {
  cells: number[];
  check: CheckedRange;
}

/** Checks with equal ranges and equal sights as one line each, in the order of cells. */
export function checkLines(checks: readonly CheckedRange[]): CheckLine[] {
  const lines = new Map<string, CheckLine>();
  for (const check of checks) {
    const { event, predicted, seen, lookedUntil } = check;
    const key = JSON.stringify([event, predicted.median, predicted.p80, predicted.p95, seen, lookedUntil]);
    const line = lines.get(key) ?? { cells: [], check };
    line.cells.push(cellNumber(check));
    lines.set(key, line);
  }
  for (const { cells } of lines.values()) cells.sort((a, b) => a - b);
  return [...lines.values()].sort((a, b) => (a.cells[0] ?? 0) - (b.cells[0] ?? 0));
}
