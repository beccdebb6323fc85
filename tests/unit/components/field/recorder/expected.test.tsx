import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { CombPicture } from '@/components/comb/comb-picture';
import { combPart } from '@/components/field/recorder/comb-part';
import { chooseState, pressExpected } from '@/components/field/recorder/desk';
import { ExpectedKey } from '@/components/field/recorder/expected-key';
import { stillExpected } from '@/components/field/recorder/expected-states';
import { commandOfKey } from '@/components/field/recorder/key-map';
import { markUnsure } from '@/components/field/recorder/recorder-acts';
import { surpriseAt } from '@/components/field/recorder/use-surprise';
import { changeWords } from '@/components/field/words/surprise-words';
import { cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { earlierMark, openDesk } from './open-recorder';

const LAST: readonly CellState[] = ['capped', 'large', 'egg', 'egg'];
const EXPECTED: readonly CellState[] = ['opened', 'capped', 'small', 'egg'];
const CELLS = spiral(LAST.length);
const RABB = { egg: 11, larva: 20, capped: 14 };

function secondVisit() {
  const { now, desk } = openDesk(CELLS.map((cell, index) => earlierMark(cell, LAST[index] ?? 'unread', index)));
  const expected = new Map(CELLS.map((cell, index) => [cellKey(cell), EXPECTED[index] ?? 'unread']));
  const marked: string[] = [];
  const at = () => ({
    ...desk(),
    expected,
    marked: (cell: { q: number; r: number }, state: CellState) => marked.push(`${cellKey(cell)} ${state}`),
  });
  const stateAt = (index: number) => now().view.marks.get(cellKey(CELLS[index] ?? { q: 9, r: 9 }))?.state;
  return { now, at, expected, marked, stateAt };
}

describe('a comb that was read before', () => {
  test('is drawn faint with what is expected, until a cell bears a mark', () => {
    const { now, at, expected } = secondVisit();
    const before = combPart(now().view, null, expected).cells;
    expect(before.map(({ state }) => state).sort()).toEqual(['capped', 'egg', 'opened', 'small']);
    expect(before.every((cell) => cell.expected)).toBe(true);
    pressExpected(at());
    const after = combPart(now().view, null, expected).cells.find((cell) => cellKey(cell) === '0,0');
    expect(after).toMatchObject({ state: 'opened' });
    expect(after?.expected).toBeUndefined();
  });

  test('says aloud that a faint cell is a guess', () => {
    const { now, expected } = secondVisit();
    const { cells } = combPart(now().view, null, expected);
    const html = renderToStaticMarkup(<CombPicture cells={cells} label="Comb" />);
    expect(html).toContain('comb-expected-glyph');
    expect(html.match(/#st-unread/g)).toHaveLength(4);
  });

  test('takes one press for a cell that holds what was expected, and steps on', () => {
    const { now, at, stateAt, marked } = secondVisit();
    pressExpected(at());
    expect(stateAt(0)).toBe('opened');
    expect(now().view.current).toEqual(CELLS[1]);
    expect(marked).toEqual(['0,0 opened']);
    expect(commandOfKey({ key: '=', shiftKey: false, ctrlKey: false, metaKey: false, altKey: false })).toEqual({
      do: 'expected',
    });
  });

  test('does nothing on that press where nothing is expected, or a mark stands already', () => {
    const { now, at, stateAt } = secondVisit();
    chooseState(at(), 'dead');
    now().jump({ q: 0, r: 0 });
    pressExpected(at());
    expect(stateAt(0)).toBe('dead');
    now().jump({ q: 0, r: -2 });
    pressExpected(at());
    expect(now().view.marks.has('0,-2')).toBe(false);
  });

  test('marks the rest in one transaction, each cell with a mark of its own that undo takes back', () => {
    const { now, at, stateAt, expected } = secondVisit();
    chooseState(at(), 'dead');
    const rest = stillExpected(now().view, expected);
    expect(rest.map(({ state }) => state)).toEqual(['capped', 'small', 'egg']);
    now().paintAll(rest);
    expect([0, 1, 2, 3].map(stateAt)).toEqual(['dead', 'capped', 'small', 'egg']);
    expect(now().view.tally.cellsTotal).toBe(4);
    expect(stillExpected(now().view, expected)).toEqual([]);
    now().undo();
    expect(stateAt(3)).toBeUndefined();
    expect(stateAt(2)).toBe('small');
  });

  test('keeps the key in its place, so that nothing moves, and shows none at a first reading', () => {
    const { at, now } = secondVisit();
    expect(renderToStaticMarkup(<ExpectedKey desk={at()} standing="ready" />)).toContain('As expected: opened');
    now().jump({ q: 0, r: -2 });
    expect(renderToStaticMarkup(<ExpectedKey desk={at()} standing="ready" />)).toContain('Nothing expected here');
    const waiting = { ...at(), expected: new Map() };
    expect(renderToStaticMarkup(<ExpectedKey desk={waiting} standing="computing" />)).toContain('computing');
    expect(renderToStaticMarkup(<ExpectedKey desk={openDesk().desk()} standing="computing" />)).toBe('');
  });
});

describe('a mark that hardly fits the last visit', () => {
  const judged = { durations: RABB, daysSince: 2 };

  test('is kept, and asked about', () => {
    const { now, at, stateAt } = secondVisit();
    chooseState(at(), 'egg');
    expect(stateAt(0)).toBe('egg');
    const surprising = surpriseAt({ q: 0, r: 0, state: 'egg' }, now().view.last, judged);
    expect(surprising?.surprise).toBe('younger');
    expect(surprising && changeWords(surprising.change)).toBe('Capped 2 days ago, egg now.');
  });

  test('is not asked about when it fits, for a new cell, or at a first reading', () => {
    const { now } = secondVisit();
    const { last } = now().view;
    expect(surpriseAt({ q: 0, r: 0, state: 'capped' }, last, judged)).toBeNull();
    expect(surpriseAt({ q: 0, r: -2, state: 'capped' }, last, judged)).toBeNull();
    expect(surpriseAt({ q: 0, r: 0, state: 'egg' }, last, { ...judged, daysSince: null })).toBeNull();
  });

  test('can be marked unsure with everything else it says, and the walk goes on', () => {
    const { now, at } = secondVisit();
    now().toggle('nectar');
    chooseState({ ...at(), detail: { note: 'odd' } }, 'egg');
    markUnsure(now(), { q: 0, r: 0 });
    expect(now().view.marks.get('0,0')).toMatchObject({ state: 'egg', unsure: true, nectar: true, note: 'odd' });
    expect(now().view.current).toEqual(CELLS[1]);
  });
});
