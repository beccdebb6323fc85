import { type Random, seededRandom } from '@/lib/kit/random';
import { type Axial, parseCellKey, ringOf } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { GENUS_ROW } from '@/lib/brood/durations';
import type { BroodMark, BroodReading } from '@/lib/brood/input';
import { DEFAULT_CONFUSION } from '@/lib/brood/nest-model/confusion';
import { looksText } from '@/lib/brood/nest-model/cell-evidence';
import type { NestHistory } from '@/lib/brood/nest-model/nest-history';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { classAt, recorded, simulateCell } from '@/tests/unit/brood/nest-model/simulate-cell';

/** A nest to be measured. */
export interface NestShape {
  cells: number;
  visits: number;
  /** Days between visits, a multiple of 0.25. */
  gap: number;
  /** Try until no two cells share a record at one distance from the pedicel, as far as the visits allow. */
  isEveryCellUnique: boolean;
}

const FIRST_VISIT = Date.parse('2026-06-01T12:00:00Z');
const DAY_MS = 86_400_000;
const TRIES = 200;

/** Errors as the readers of the default settings make them. */
const ERRORS = { confusion: DEFAULT_CONFUSION, floor: 0 };

/** What was recorded of one simulated cell at all visits; built about a day a cell before the first. */
function record(random: Random, rank: number, { cells, visits, gap }: NestShape): string[] {
  const settings = DEFAULT_SETTINGS;
  const built = -45 * Math.sqrt(1 - rank / (cells + 1)) + (random() - 0.5) * 6;
  const cell = simulateCell(random, { row: GENUS_ROW, settings, rho: 1 }, built);
  return Array.from({ length: visits }, (_, i) => recorded(random, ERRORS, classAt(cell, i * gap)));
}

/** Simulated records of a nest, cell by cell along the spiral. */
function records(shape: NestShape, seed: number): { at: Axial; seen: string[] }[] {
  const random = seededRandom(seed);
  const known = new Set<string>();
  return spiral(shape.cells).map((at, rank) => {
    for (let tries = 0; ; tries++) {
      const seen = record(random, rank, shape);
      const key = `${ringOf(at)} ${seen.join(' ')}`;
      const isLastPossible = seen.every((name) => name === 'absent');
      if (isLastPossible || (shape.isEveryCellUnique && known.has(key) && tries < TRIES)) continue;
      known.add(key);
      return { at, seen };
    }
  });
}

/** The readings of a simulated nest. Cells recorded as absent have no mark. */
export function simulatedReadings(shape: NestShape, seed: number): BroodReading[] {
  const cells = records(shape, seed);
  return Array.from({ length: shape.visits }, (_, i) => ({
    id: `visit-${i}`,
    at: FIRST_VISIT + i * shape.gap * DAY_MS,
    marks: cells.flatMap(({ at, seen }): BroodMark[] =>
      seen[i] === undefined || seen[i] === 'absent' ? [] : [{ ...at, state: seen[i] as CellState }],
    ),
  }));
}

/** The same kind of records for the core: distinct ones, as classes by visit. */
export function simulatedRecords(shape: NestShape, seed: number): string[][] {
  const seen = records(shape, seed).map((cell) => cell.seen);
  return [...new Map(seen.map((classes) => [classes.join(' '), classes])).values()];
}

/** How many of the cells differ in what was seen or in how far they are from the pedicel. */
export function countGroups({ cells }: NestHistory): number {
  return new Set([...cells].map(([key, looks]) => `${ringOf(parseCellKey(key))} ${looksText(looks)}`)).size;
}
