import { describe, expect, it } from 'vitest';
import { cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { CellStory } from '@/lib/server/demo/story/reading-story';
import { N12 } from '@/lib/server/demo/tarrow/nests/n12';
import { N12_CELLS } from '@/lib/server/demo/tarrow/nests/n12-cells';
import { TARROW } from '@/lib/server/demo/tarrow/tarrow';
import { countsOf, opsOf, readingId, readingMarks } from './fold-ops';

/** Tallied by hand from the sheet of N12's three readings. */
const BY_HAND = {
  field: { cellsTotal: 33, capped: 6, parasitised: 1, large: 6, medium: 4, small: 6, egg: 9, empty: 1 },
  blind: { cellsTotal: 33, capped: 7, large: 7, medium: 4, small: 5, egg: 10 },
  final: { capped: 6, parasitised: 1, large: 7, medium: 3, small: 6, egg: 10 },
};

const ops = opsOf(TARROW);
const stateAt = (cells: readonly CellStory[]) => new Map(cells.map((cell) => [cellKey(cell), cell.state]));

describe('nest N12', () => {
  it('gives the field tally counted by hand once its operations are folded', () => {
    expect(countsOf(readingMarks(ops, readingId('N12', 'take-down', 'field')))).toEqual(BY_HAND.field);
  });

  it('gives the blind tally counted by hand once its operations are folded', () => {
    expect(countsOf(readingMarks(ops, readingId('N12', 'take-down', 'second')))).toEqual(BY_HAND.blind);
  });

  it('is read along the walk: the number of each cell is its place in the sheet', () => {
    expect(N12_CELLS.field.map(cellNumber)).toEqual(Array.from({ length: 33 }, (_, i) => i));
  });

  it('has two readers who agree on 29 of 33 cells', () => {
    const blind = stateAt(N12_CELLS.blind);
    expect(N12_CELLS.field.filter((cell) => blind.get(cellKey(cell)) === cell.state)).toHaveLength(29);
  });

  it('becomes the final reading of the sheet when the settled cells are laid over the field reading', () => {
    const cells = stateAt(N12_CELLS.field);
    for (const { act } of N12.decisions) {
      if (act.kind === 'settle') for (const cell of act.cells) cells.set(cellKey(cell), cell.state);
    }
    expect(cells).toEqual(stateAt(N12_CELLS.final));
    const counts: Partial<Record<CellState, number>> = {};
    for (const state of cells.values()) counts[state] = (counts[state] ?? 0) + 1;
    expect(counts).toEqual(BY_HAND.final);
  });

  it('has a reason for every cell on which the readers differ, and for no other', () => {
    const blind = stateAt(N12_CELLS.blind);
    const disputed = N12_CELLS.field.filter((cell) => blind.get(cellKey(cell)) !== cell.state).map(cellKey);
    const settled = N12.decisions.flatMap(({ act }) => (act.kind === 'settle' ? act.cells.map(cellKey) : []));
    expect([...settled].sort()).toEqual([...disputed].sort());
  });

  it('is settled, locked, amended and locked again as version 2', () => {
    expect(N12.decisions.map(({ act, leaves }) => [act.kind, leaves.version, leaves.lockedVersion])).toEqual([
      ['settle', 1, null],
      ['lock', 1, 1],
      ['amend', 2, 1],
      ['lock', 2, 2],
    ]);
  });

  it('is read in the field by Senna Vautry, blind by Halloran Pike, and settled by Dr Loos', () => {
    const readers = N12.visits.flatMap(({ readings }) => readings.map(({ by }) => by.name));
    expect(readers).toEqual(['Senna Vautry', 'Halloran Pike']);
    expect(new Set(N12.decisions.map(({ by }) => by.name))).toEqual(new Set(['Dr Wystan Loos']));
  });
});
