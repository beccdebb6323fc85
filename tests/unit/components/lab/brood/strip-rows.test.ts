import { describe, expect, it } from 'vitest';
import { isStripSort, stripOf, stripRows } from '@/components/lab/brood/strip-rows';
import type { BroodRow } from '@/components/lab/brood-rows';
import type { CellState } from '@/lib/comb/states';

const spread = (median: string) => {
  const range: [string, string] = [median, median];
  return { median, p50: range, p80: range, p95: range };
};

const row = (cells: number[], state: CellState, days: [laid: string, capped: string | null]): BroodRow => ({
  cells,
  state,
  laid: spread(days[0]),
  capped: days[1] ? spread(days[1]) : null,
  emerges: days[1] ? spread(days[1]) : null,
});

const ROWS = [
  row([2, 9], 'egg', ['2026-06-10', '2026-07-11']),
  row([5], 'capped', ['2026-05-09', '2026-06-09']),
  row([1], 'large', ['2026-05-20', null]),
];
const cellsOf = (rows: readonly BroodRow[]) => rows.map(({ cells }) => cells.join());

describe('the order of the strips', () => {
  it('is the oldest first, by cell, or by what comes soonest; what is not known comes last', () => {
    expect(cellsOf(stripRows(ROWS, { sort: 'laid', grouped: true }))).toEqual(['5', '1', '2,9']);
    expect(cellsOf(stripRows(ROWS, { sort: 'cell', grouped: true }))).toEqual(['1', '2,9', '5']);
    expect(cellsOf(stripRows(ROWS, { sort: 'capped', grouped: true }))).toEqual(['5', '2,9', '1']);
    expect(cellsOf(stripRows(ROWS, { sort: 'state', grouped: true }))).toEqual(['5', '1', '2,9']);
  });

  it('shows equal cells apart when asked', () => {
    expect(cellsOf(stripRows(ROWS, { sort: 'cell', grouped: false }))).toEqual(['1', '2', '5', '9']);
  });

  it('leaves the rows it was given as they were', () => {
    const before = cellsOf(ROWS);
    stripRows(ROWS, { sort: 'cell', grouped: true });
    expect(cellsOf(ROWS)).toEqual(before);
  });

  it('names the cells of a strip', () => {
    expect(ROWS.map((each) => stripOf(each).label)).toEqual(['cells 2, 9', 'cell 5', 'cell 1']);
  });

  it('knows its own words from those of others', () => {
    expect(isStripSort('laid')).toBe(true);
    expect(isStripSort('toString')).toBe(false);
  });
});
