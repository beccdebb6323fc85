import { compareHlc } from '@/lib/kit/hlc';
import { cellKey } from './axial';
import type { Mark } from './mark';
import { byWalkOrder } from './walk';

/** Orders marks so that the winner of a cell comes last: by clock, then by operation id. */
export function compareMarks(a: Pick<Mark, 'hlc' | 'opId'>, b: Pick<Mark, 'hlc' | 'opId'>): number {
  const byClock = compareHlc(a.hlc, b.hlc);
  if (byClock !== 0 || a.opId === b.opId) return byClock;
  return a.opId < b.opId ? -1 : 1;
}

/**
 * The marks that are neither retracted nor superseded by a mark that is itself live.
 *
 * Works from the newest replacements backwards, without recursion, so that a cell whose mind was changed
 * thousands of times is read as safely as any other. Marks that supersede each other in a ring are not live.
 */
function standing(marks: readonly Mark[], retracted: ReadonlySet<string>): Mark[] {
  const byId = new Map(marks.map((mark) => [mark.opId, mark]));
  const undecided = new Map<string, number>();
  for (const { supersedes } of marks) {
    if (supersedes !== null) undecided.set(supersedes, (undecided.get(supersedes) ?? 0) + 1);
  }
  const replaced = new Set<string>();
  const live: Mark[] = [];
  const ready = marks.filter((mark) => !undecided.has(mark.opId));
  for (let mark = ready.pop(); mark; mark = ready.pop()) {
    const isLive = !retracted.has(mark.opId) && !replaced.has(mark.opId);
    if (isLive) live.push(mark);
    if (mark.supersedes === null) continue;
    if (isLive) replaced.add(mark.supersedes);
    const left = (undecided.get(mark.supersedes) ?? 0) - 1;
    undecided.set(mark.supersedes, left);
    const parent = byId.get(mark.supersedes);
    if (left === 0 && parent) ready.push(parent);
  }
  return live;
}

/**
 * The current view of a reading: for every cell its live mark with the highest clock, then operation id.
 * Retracting a mark revives what it superseded.
 *
 * @param marks all marks of one reading, any order.
 * @param retracted the ids of retracted marks.
 * @returns one mark a cell, in walk order.
 */
export function liveMarks(marks: readonly Mark[], retracted: ReadonlySet<string>): Mark[] {
  const winners = new Map<string, Mark>();
  for (const mark of standing(marks, retracted)) {
    const key = cellKey(mark);
    const best = winners.get(key);
    if (!best || compareMarks(best, mark) < 0) winners.set(key, mark);
  }
  return [...winners.values()].sort(byWalkOrder);
}
