import { cellKey, parseCellKey } from '@/lib/comb/axial';
import { byWalkOrder } from '@/lib/comb/walk';
import type { BroodReading } from '@/lib/brood/input';
import { DAY_MS } from '@/lib/brood/date-range';
import { type CellLooks, type Look, lookOf } from './cell-evidence';
import type { CombCount } from './building';

/** All that was seen of a nest, by visit. */
export interface NestHistory {
  /** Epoch milliseconds of the first visit at which somebody looked into a cell; days count from here. */
  origin: number;
  /** Days of the visits with looks, rising. */
  days: readonly number[];
  /** Looks by cell; cells that nobody ever looked into are left out. */
  cells: ReadonlyMap<string, CellLooks>;
  /** Cells there at each visit. */
  counts: readonly CombCount[];
}

const ABSENT: Look = { state: 'absent', instar: null, unsure: false, reused: false };

/** The visits at which somebody looked into a cell; readings of one moment are one visit. */
function visitsOf(readings: readonly BroodReading[]): BroodReading[][] {
  const byTime = new Map<number, BroodReading[]>();
  for (const reading of readings) {
    if (!reading.marks.some((mark) => lookOf(mark) !== null)) continue;
    byTime.set(reading.at, [...(byTime.get(reading.at) ?? []), reading]);
  }
  return [...byTime].sort(([a], [b]) => a - b).map(([, group]) => group);
}

/** For each cell the visits that have a mark of it, and its looks by visit. */
function marksByCell(visits: readonly BroodReading[][]) {
  const cells = new Map<string, { marked: Set<number>; looks: Look[][] }>();
  visits.forEach((readings, visit) => {
    for (const mark of readings.flatMap(({ marks }) => marks)) {
      const key = cellKey(mark);
      const cell = cells.get(key) ?? { marked: new Set(), looks: visits.map(() => []) };
      cells.set(key, cell);
      cell.marked.add(visit);
      const look = lookOf(mark);
      if (look) cell.looks[visit]?.push(look);
    }
  });
  return cells;
}

/** A cell without a mark was not there yet as long as no reading has held it; later it was just not looked at. */
function withAbsence({ marked, looks }: { marked: ReadonlySet<number>; looks: readonly Look[][] }): CellLooks {
  const first = Math.min(...marked);
  const last = looks.findLastIndex((atVisit) => atVisit.length > 0);
  return looks.slice(0, last + 1).map((atVisit, visit) => (visit < first ? [ABSENT] : atVisit));
}

/**
 * Puts readings together to what was seen of each cell. Visits at which nobody looked into any cell say nothing and
 * are left out altogether.
 *
 * @returns null when nobody looked into any cell.
 */
export function nestHistory(readings: readonly BroodReading[]): NestHistory | null {
  const visits = visitsOf(readings);
  const origin = visits[0]?.[0]?.at;
  if (origin === undefined) return null;
  const byCell = marksByCell(visits);
  const looked = [...byCell]
    .filter(([, { looks }]) => looks.some((atVisit) => atVisit.length > 0))
    .sort(([a], [b]) => byWalkOrder(parseCellKey(a), parseCellKey(b)));
  const days = visits.map(([reading]) => ((reading?.at ?? origin) - origin) / DAY_MS);
  const counts = days.map((day, visit) => ({
    day,
    cells: [...byCell.values()].filter(({ marked }) => Math.min(...marked) <= visit).length,
  }));
  return { origin, days, cells: new Map(looked.map(([key, cell]) => [key, withAbsence(cell)])), counts };
}
