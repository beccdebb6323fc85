import { describe, expect, test } from 'vitest';
import { type BenchMemory, FRESH_MEMORY, goTo, runBench } from '@/components/field/second/bench-acts';
import { type BenchCommand, type BenchKeyPress, benchCommand } from '@/components/field/second/bench-keys';
import { CELL_STATES, STATE_LETTERS } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { openRecorder } from '@/tests/unit/components/field/recorder/open-recorder';

const PLAIN = { shiftKey: false, ctrlKey: false, metaKey: false, altKey: false };

function press(key: string, more: Partial<BenchKeyPress> = {}): BenchKeyPress {
  return { ...PLAIN, key, code: '', ...more };
}

/** A bench on the product's own recorder that is typed on. */
function bench() {
  const { now } = openRecorder();
  let memory: BenchMemory = FRESH_MEMORY;
  const run = (command: BenchCommand | null): void => {
    if (command && command.do !== 'finish') memory = runBench(now(), memory, command);
  };
  return {
    now,
    memory: () => memory,
    type: (...keys: (string | BenchKeyPress)[]) => {
      for (const key of keys) run(benchCommand(typeof key === 'string' ? press(key) : key));
    },
    go: (q: number, r: number) => {
      memory = goTo(now(), memory, { q, r });
    },
    at: (q: number, r: number) => now().view.marks.get(`${q},${r}`),
  };
}

const UNDO = press('Backspace');
const REDO = press('y', { ctrlKey: true });

describe('the keys of the bench', () => {
  test('are the letters of the paper sheet, each for its state, and step on along the walk', () => {
    const { type, now } = bench();
    type(...CELL_STATES.map((state) => STATE_LETTERS[state]));
    const marks = [...now().view.marks.values()];
    expect(marks.map(({ state }) => state)).toEqual(CELL_STATES);
    expect(marks.map(({ q, r }) => ({ q, r }))).toEqual(spiral(12));
  });

  test('put marks typed after a letter on that letter’s cell, as on the paper sheet', () => {
    const { type, at, now } = bench();
    type('o', "'", 's', '?', 'o');
    expect(at(0, 0)).toMatchObject({ state: 'egg', nectar: true, unsure: false });
    expect(at(0, -1)).toMatchObject({ state: 'small', nectar: false, unsure: true });
    expect(at(1, -1)).toMatchObject({ state: 'egg', nectar: false, unsure: false });
    expect(now().view.tally).toMatchObject({ cellsTotal: 3, nectarCells: 1 });
  });

  test('put marks on the cell one has gone to, and stay there', () => {
    const { type, at, go, now } = bench();
    type('o', 'o', 'o');
    go(0, 0);
    type("'", 'r');
    expect(at(0, 0)).toMatchObject({ nectar: true, reused: true });
    expect(now().view.current).toEqual({ q: 0, r: 0 });
    expect(at(1, -1)).toMatchObject({ nectar: false, reused: false });
  });

  test('take a digit as the instar of a larva that can be of it, and say so when it can not', () => {
    const { type, at, memory } = bench();
    type('s', '2', 'm', '4', 'l', '5');
    expect([at(0, 0), at(0, -1), at(1, -1)].map((mark) => mark?.instar)).toEqual([2, 4, 5]);
    type('3');
    expect(at(1, -1)?.instar).toBe(5);
    expect(memory().words).toContain('no larva of instar 3');
    type('c', '5');
    expect(memory().words).toContain('no larva of instar 5');
  });

  test.each([
    ['[', 0, -1],
    [']', 1, -1],
    ['ArrowRight', 1, 0],
    ['.', 0, 1],
    [',', -1, 1],
    ['ArrowLeft', -1, 0],
  ])('reach the six neighbours: %s goes to %i, %i', (key, q, r) => {
    const { type, go, now } = bench();
    type(...Array.from({ length: 7 }, () => 'o'));
    go(0, 0);
    type(key);
    expect(now().view.current).toEqual({ q, r });
  });

  test('reach the slanting neighbours also where brackets need AltGr, and by where the keys lie', () => {
    expect(benchCommand(press('[', { ctrlKey: true, altKey: true }))).toEqual({ do: 'neighbour', way: 0 });
    expect(benchCommand(press('ü', { code: 'BracketLeft' }))).toEqual({ do: 'neighbour', way: 0 });
    expect(benchCommand(press('ü', { code: 'BracketLeft', ctrlKey: true }))).toBeNull();
  });

  test('take back and do again without end, until something else is marked', () => {
    const { type, at, now, memory } = bench();
    type('o', "'", 'c', UNDO, UNDO, UNDO);
    expect(now().view.tally.cellsTotal).toBe(0);
    type(REDO, REDO, REDO);
    expect([at(0, 0), at(0, -1)]).toMatchObject([{ state: 'egg', nectar: true }, { state: 'capped' }]);
    type(REDO);
    expect(memory().words).toBe('Nothing was taken back.');
    type(UNDO, 's', REDO);
    expect(at(0, -1)).toMatchObject({ state: 'small' });
  });

  test('say that there is no cell, but never throw a mark away for it', () => {
    const { type, go, now, memory } = bench();
    type('o', 'n', 'o');
    expect([...now().view.marks.keys()]).toEqual(['0,0', '1,-1']);
    go(0, 0);
    type('n');
    expect(now().view.marks.has('0,0')).toBe(true);
    expect(memory().words).toContain('Take it back first');
  });

  test('say that the walk is over when every counted cell has a mark', () => {
    const { type, now, memory } = bench();
    now().expect(2);
    type('o', 'o', 'c');
    expect(now().view.tally.cellsTotal).toBe(2);
    expect(memory().words).toContain('Every cell you counted');
  });

  test('leave every other key to the browser', () => {
    for (const key of ['Tab', 'a', 'e', '6', 'F5', 'Enter']) expect(benchCommand(press(key))).toBeNull();
    expect(benchCommand(press('f', { ctrlKey: true }))).toBeNull();
    expect(benchCommand(press('f'))).toEqual({ do: 'finish' });
  });
});
