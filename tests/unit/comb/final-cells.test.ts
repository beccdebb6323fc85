import { describe, expect, it } from 'vitest';
import { type CellSettlement, finalCells, markedCells } from '@/lib/comb/final-cells';
import type { Mark } from '@/lib/comb/mark';

function mark(q: number, r: number, more: Partial<Mark> = {}): Mark {
  return {
    q,
    r,
    state: 'medium',
    nectar: false,
    unsure: false,
    reused: false,
    scrap: false,
    instar: null,
    note: null,
    opId: `mark ${q},${r}`,
    hlc: '1.0',
    supersedes: null,
    at: '2026-06-16T05:41:07.120-04:00',
    ...more,
  };
}

function settlement(q: number, r: number, more: Partial<CellSettlement> = {}): CellSettlement {
  return { q, r, state: 'large', position: 1, markOpId: `mark ${q},${r}`, ...more };
}

describe('finalCells', () => {
  it('leaves a cell nobody settled as it was marked', () => {
    expect(finalCells([mark(0, 0)], [])).toEqual(markedCells([mark(0, 0)]));
    expect(markedCells([mark(0, 0)])[0]).toMatchObject({ settledFrom: null, settled: false, opId: 'mark 0,0' });
  });

  it('puts the settled state over the mark and names the mark it replaced', () => {
    const [cell] = finalCells([mark(0, 0, { nectar: true, reused: true, note: 'rim' })], [settlement(0, 0)]);
    expect(cell).toMatchObject({
      state: 'large',
      nectar: true,
      reused: true,
      note: 'rim',
      settledFrom: 'mark 0,0',
      settled: true,
    });
    expect(cell).toMatchObject({ opId: 'mark 0,0', at: '2026-06-16T05:41:07.120-04:00' });
  });

  it('drops doubt and instar with the state they spoke about', () => {
    const marked = mark(0, 0, { unsure: true, instar: 4 });
    expect(finalCells([marked], [settlement(0, 0)])[0]).toMatchObject({ unsure: false, instar: null });
    expect(finalCells([marked], [settlement(0, 0, { state: 'medium' })])[0]).toMatchObject({ unsure: true, instar: 4 });
  });

  it('lets the later decision about a cell stand, whatever order they come in', () => {
    const first = settlement(0, 0, { state: 'egg', position: 1 });
    const second = settlement(0, 0, { state: 'small', position: 2 });
    for (const order of [
      [first, second],
      [second, first],
    ]) {
      expect(finalCells([mark(0, 0)], order)[0]?.state).toBe('small');
    }
  });

  it('brings doubt and instar back when a decision returns to the state that was marked', () => {
    const away = settlement(0, 0, { state: 'egg', position: 1 });
    const back = settlement(0, 0, { state: 'medium', position: 2 });
    expect(finalCells([mark(0, 0, { unsure: true })], [away, back])[0]).toMatchObject({
      state: 'medium',
      unsure: true,
    });
  });

  it('adds a cell that nobody had marked, in walk order', () => {
    const cells = finalCells([mark(1, -1)], [settlement(0, -1, { state: 'egg', markOpId: null })]);
    expect(cells.map(({ q, r, opId, at, settledFrom }) => [q, r, opId, at, settledFrom])).toEqual([
      [0, -1, null, null, null],
      [1, -1, 'mark 1,-1', '2026-06-16T05:41:07.120-04:00', null],
    ]);
  });
});
