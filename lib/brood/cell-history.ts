import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { byWalkOrder } from '@/lib/comb/walk';
import type { BroodMark, BroodReading } from './input';
import { type StageGroup, stageGroup } from './stages';

/** One look into one cell. */
export interface Sighting {
  at: number;
  mark: BroodMark;
}

/** Everything recorded of one cell, oldest first. */
interface CellHistory extends Axial {
  sightings: readonly Sighting[];
}

/** A living brood seen in a cell. */
export interface BroodSighting {
  at: number;
  group: StageGroup;
}

/** What the history of a cell comes to. */
export interface CellView extends Axial {
  /** The state last recorded, leaving out `unread` where there is another. */
  state: CellState;
  /** The living brood now in the cell, or null. */
  brood: BroodSighting | null;
  /** The sightings in which the cell was really looked into, oldest first. */
  looked: readonly Sighting[];
}

const NOT_LOOKED_AT: ReadonlySet<CellState> = new Set(['unread', 'webbed', 'damaged']);

/** The readings up to an instant, oldest first. */
export function readingsUntil(readings: readonly BroodReading[], asOf: number): BroodReading[] {
  return readings.filter(({ at }) => at <= asOf).sort((a, b) => a.at - b.at || (a.id < b.id ? -1 : 1));
}

/** The history of every cell, in walk order. */
export function cellHistories(readings: readonly BroodReading[]): CellHistory[] {
  const byCell = new Map<string, Axial & { sightings: Sighting[] }>();
  for (const { at, marks } of readings) {
    for (const mark of marks) {
      const key = cellKey(mark);
      const cell = byCell.get(key) ?? { q: mark.q, r: mark.r, sightings: [] };
      cell.sightings.push({ at, mark });
      byCell.set(key, cell);
    }
  }
  return [...byCell.values()].sort(byWalkOrder);
}

/** Does the later of two living broods have to be another one? An egg after a larva, or anything after a cap. */
export function isRestart(before: StageGroup, after: StageGroup): boolean {
  const isEggAgain = after.key === 'egg' && before.key !== 'egg';
  return isEggAgain || (before.key === 'capped' && after.key !== 'capped');
}

/** Reads a cell's history: what it was last recorded as, and the living brood in it. */
export function viewCell({ q, r, sightings }: CellHistory): CellView {
  const looked = sightings.filter(({ mark }) => !NOT_LOOKED_AT.has(mark.state));
  const recorded = sightings.filter(({ mark }) => mark.state !== 'unread').at(-1);
  const last = looked.at(-1);
  const group = last ? stageGroup(last.mark) : null;
  return {
    q,
    r,
    state: recorded?.mark.state ?? 'unread',
    brood: last && group ? { at: last.at, group } : null,
    looked,
  };
}
