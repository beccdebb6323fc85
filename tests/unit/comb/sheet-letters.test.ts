import { describe, expect, test } from 'vitest';
import { readSheet, readSheetLine } from '@/lib/comb/sheet-letters';
import { CELL_STATES, STATE_LETTERS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';

describe('a typed line of a paper sheet', () => {
  test('gives each letter to the next cell of the ring, clockwise from 12', () => {
    const { marks, faults, places } = readSheetLine(1, 'coslm-');
    expect(marks.map((mark) => [cellNumber(mark), mark.state])).toEqual([
      [1, 'capped'],
      [2, 'egg'],
      [3, 'small'],
      [4, 'large'],
      [5, 'medium'],
      [6, 'empty'],
    ]);
    expect(faults).toEqual([]);
    expect(places).toBe(6);
  });

  test.each(CELL_STATES)('knows the letter of %s, large or small', (state) => {
    const letter = STATE_LETTERS[state];
    expect(readSheetLine(0, letter).marks).toMatchObject([{ q: 0, r: 0, state }]);
    expect(readSheetLine(0, letter.toUpperCase()).marks).toMatchObject([{ state }]);
  });

  test('takes the sign behind a letter for its own cell', () => {
    expect(readSheetLine(1, "o' c? s’? l'").marks).toMatchObject([
      { state: 'egg', nectar: true, unsure: false },
      { state: 'capped', nectar: false, unsure: true },
      { state: 'small', nectar: true, unsure: true },
      { state: 'large', nectar: true, unsure: false },
    ]);
  });

  test('passes a place without a cell, and reads nothing into gaps and commas', () => {
    const { marks, places } = readSheetLine(1, ' c, . .\to  ');
    expect(marks.map(cellNumber)).toEqual([1, 4]);
    expect(places).toBe(4);
  });

  test('takes the dashes of other keyboards for empty', () => {
    expect(readSheetLine(1, '–—-').marks.map(({ state }) => state)).toEqual(['empty', 'empty', 'empty']);
  });

  test('says which cell has a letter that the sheet does not know, and keeps the others in their places', () => {
    const { marks, faults } = readSheetLine(1, 'czo');
    expect(faults).toEqual([{ ring: 1, cell: 2, text: 'z' }]);
    expect(marks.map((mark) => [cellNumber(mark), mark.state])).toEqual([
      [1, 'capped'],
      [3, 'egg'],
    ]);
  });

  test('says when a ring has no place left', () => {
    expect(readSheetLine(0, 'co').faults).toEqual([{ ring: 0, cell: null, text: 'o' }]);
    expect(readSheetLine(1, 'ccccccc').faults).toEqual([{ ring: 1, cell: null, text: 'c' }]);
  });

  test('makes nothing of signs without a letter', () => {
    expect(readSheetLine(1, "' ? ’")).toEqual({ marks: [], faults: [], places: 0 });
  });
});

test('a sheet is its lines, ring after ring', () => {
  const lines = readSheet(['c', 'oooooo', 's']);
  expect(lines.flatMap(({ marks }) => marks.map(cellNumber))).toEqual([0, 1, 2, 3, 4, 5, 6, 7]);
});
