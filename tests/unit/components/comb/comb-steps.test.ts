import { describe, expect, it } from 'vitest';
import { isStepKey, type StepKey, stepFrom } from '@/components/comb/comb-steps';
import { type Axial, cellKey, neighbours } from '@/lib/comb/axial';
import { spiral } from '@/lib/comb/walk';

const comb = spiral(61);
const inner = spiral(37);
const go = (from: Axial, key: StepKey, shift = false) => stepFrom(from, { key, shift }, comb);

describe('walking a comb by keys', () => {
  it('reaches all six neighbours of every inner cell with arrows, and with Shift the two left out', () => {
    for (const cell of inner) {
      const reached = [
        go(cell, 'ArrowLeft'),
        go(cell, 'ArrowRight'),
        ...[false, true].flatMap((shift) => [go(cell, 'ArrowUp', shift), go(cell, 'ArrowDown', shift)]),
      ];
      expect(reached.map(cellKey).sort()).toEqual(neighbours(cell).map(cellKey).sort());
    }
  });

  it('comes back: up then down, left then right, from every inner cell', () => {
    for (const cell of inner) {
      expect(go(go(cell, 'ArrowUp'), 'ArrowDown')).toEqual(cell);
      expect(go(go(cell, 'ArrowLeft'), 'ArrowRight')).toEqual(cell);
    }
  });

  it('keeps a column: four steps up stay above the start', () => {
    let at: Axial = { q: -2, r: 4 };
    for (let step = 0; step < 4; step++) at = go(at, 'ArrowUp');
    expect(at).toEqual({ q: 0, r: 0 });
  });

  it('goes to the ends of the walk with Home and End, and along it with the page keys', () => {
    expect(go({ q: 2, r: 0 }, 'Home')).toEqual({ q: 0, r: 0 });
    expect(go({ q: 2, r: 0 }, 'End')).toEqual(comb.at(-1));
    expect(go({ q: 0, r: 0 }, 'PageDown')).toEqual(comb[1]);
    expect(go({ q: 0, r: -1 }, 'PageUp')).toEqual({ q: 0, r: 0 });
  });

  it('stays at the edge of the comb', () => {
    expect(go({ q: 4, r: 0 }, 'ArrowRight')).toEqual({ q: 4, r: 0 });
    expect(go({ q: 0, r: -4 }, 'ArrowUp')).toEqual({ q: 0, r: -4 });
    expect(go({ q: 0, r: 0 }, 'PageUp')).toEqual({ q: 0, r: 0 });
  });

  it('steps over a hole in a row and to the nearest cell of a lopsided one', () => {
    const holed = comb.filter((cell) => cellKey(cell) !== '1,0');
    expect(stepFrom({ q: 0, r: 0 }, { key: 'ArrowRight', shift: false }, holed)).toEqual({ q: 2, r: 0 });
    const lopsided = [
      { q: 0, r: 0 },
      { q: 3, r: 1 },
    ];
    expect(stepFrom({ q: 0, r: 0 }, { key: 'ArrowDown', shift: false }, lopsided)).toEqual({ q: 3, r: 1 });
  });

  it('takes only its own keys', () => {
    expect(isStepKey('ArrowUp')).toBe(true);
    expect(isStepKey('m')).toBe(false);
  });
});
