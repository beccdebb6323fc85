import { ringOf, cellKey } from '@/lib/comb/axial';
import type { Mark } from '@/lib/comb/mark';
import { STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { RecorderView, UnsavedPress } from '@/lib/offline/recorder-view';
import { progressWords } from './reading-words';

const MARK_WORDS = [
  ['nectar', 'nectar'],
  ['unsure', 'unsure'],
  ['reused', 'reused'],
  ['scrap', 'prey scrap'],
] as const;

/** What a mark says: `egg, nectar, unsure`. */
export function markWords(
  mark: Pick<Mark, 'state' | 'nectar' | 'unsure' | 'reused' | 'scrap' | 'instar' | 'note'>,
): string {
  const marks = MARK_WORDS.filter(([name]) => mark[name]).map(([, word]) => word);
  const instar = mark.instar === null ? [] : [`instar ${mark.instar}`];
  const note = mark.note === null ? [] : ['note'];
  return [STATE_WORDS[mark.state], ...instar, ...marks, ...note].join(', ');
}

/**
 * The line under the number of the current cell: its ring, and what it holds if it bears a mark, else how far the walk
 * is: `ring 2 · 14 of 33`.
 */
export function cellLine({ current, marks, tally, expectedTotal }: RecorderView): string {
  const progress = progressWords(tally.cellsTotal, expectedTotal);
  if (!current) return progress;
  const mark = marks.get(cellKey(current));
  const ring = ringOf(current);
  return `${ring === 0 ? 'pedicel cell' : `ring ${ring}`} · ${mark ? markWords(mark) : progress}`;
}

/** What the current cell held at the last visit; blank for a new cell, null when there was no earlier reading. */
export function earlierLine({ current, last }: Pick<RecorderView, 'current' | 'last'>): string | null {
  if (last.size === 0) return null;
  const earlier = current && last.get(cellKey(current));
  return earlier ? `last time ${STATE_WORDS[earlier.state]}` : '\u00a0';
}

/** What a cell is called: `Cell 14`. */
export function cellTitle(current: RecorderView['current']): string {
  return current ? `Cell ${cellNumber(current)}` : 'All read';
}

/** A press that was not kept, as it is called out: `Cell 13: egg` → `cell 13, egg`. */
export function unsavedWords({ words }: Pick<UnsavedPress, 'words'>): string {
  return words.replace(/^Cell/, 'cell').replace(':', ',');
}

const REASONS: Readonly<Record<UnsavedPress['reason'], string>> = {
  full: 'This phone’s storage is full. Make room, then try again.',
  cleared: 'The browser has cleared this phone’s storage. Make a copy now.',
  timeout: 'The storage does not answer. Try again.',
  storage: 'The storage failed. Try again.',
};

/** Why a press could not be kept, and what to do. */
export function unsavedReason({ reason }: Pick<UnsavedPress, 'reason'>): string {
  return REASONS[reason];
}
