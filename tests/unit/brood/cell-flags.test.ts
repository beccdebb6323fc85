import { describe, expect, it } from 'vitest';
import type { CellState } from '@/lib/comb/states';
import type { BroodMark } from '@/lib/brood/input';
import { estimate, reading } from './support';

const START = Date.parse('2026-06-01T12:00:00Z');

/** The flags of a cell seen in these states, so many days after the first look. */
function flagsOf(looks: readonly (readonly [day: number, state: CellState, rest?: Partial<BroodMark>])[]) {
  const readings = looks.map(([day, state, rest]) => {
    const at = new Date(START + day * 86_400_000).toISOString();
    return reading(at, [
      { q: 0, r: 0, state, ...rest },
      { q: 1, r: 0, state: 'egg' },
    ]);
  });
  return estimate(readings).flags.filter(({ cell }) => cell?.q === 0);
}

const codes = (looks: Parameters<typeof flagsOf>[0]) => flagsOf(looks).map(({ code }) => code);

describe('surprising histories are explained, never refused', () => {
  it('asks about an egg within a week of a cap, when no opened cell was seen', () => {
    expect(
      codes([
        [0, 'capped'],
        [2, 'egg'],
      ]),
    ).toEqual(['capped-to-egg']);
  });

  it('does not ask when the cell was seen open in between, or is marked reused', () => {
    expect(
      codes([
        [0, 'capped'],
        [2, 'opened'],
        [4, 'egg'],
      ]),
    ).toEqual([]);
    expect(
      codes([
        [0, 'capped'],
        [4, 'egg', { reused: true }],
      ]),
    ).toEqual([]);
  });

  it('says that a cap that is gone means an adult or a loss', () => {
    expect(
      codes([
        [0, 'capped'],
        [10, 'empty'],
      ]),
    ).toEqual(['capped-gone']);
    expect(
      codes([
        [0, 'capped'],
        [12, 'egg'],
      ]),
    ).toEqual(['capped-gone']);
    expect(
      codes([
        [0, 'capped'],
        [30, 'medium'],
      ]),
    ).toEqual(['capped-gone']);
  });

  it('takes a larva soon after a cap for a slip', () => {
    expect(
      codes([
        [0, 'capped'],
        [3, 'large'],
      ]),
    ).toEqual(['step-back']);
  });

  it('M C32: accepts a larva followed by an egg as loss and re-laying, with a flag', () => {
    expect(
      codes([
        [0, 'medium'],
        [6, 'egg'],
      ]),
    ).toEqual(['relaid']);
  });

  it('takes a larva that looks younger for a slip', () => {
    expect(
      codes([
        [0, 'large'],
        [3, 'medium'],
      ]),
    ).toEqual(['step-back']);
  });

  it('asks about development faster or slower than expected', () => {
    expect(
      codes([
        [0, 'egg'],
        [2, 'large'],
      ]),
    ).toEqual(['too-fast', 'contradictory']);
    expect(
      codes([
        [0, 'small'],
        [3, 'opened'],
      ]),
    ).toEqual(['too-fast', 'contradictory']);
    expect(
      codes([
        [0, 'egg'],
        [30, 'egg'],
      ]),
    ).toEqual(['too-slow']);
  });

  it('has nothing to say of an ordinary life', () => {
    expect(
      codes([
        [0, 'egg'],
        [7, 'small'],
        [14, 'small'],
        [21, 'large'],
        [28, 'capped'],
        [42, 'opened'],
      ]),
    ).toEqual([]);
  });

  it('compares the last two looks only, passing over a visit that could not look in', () => {
    expect(
      codes([
        [0, 'capped'],
        [1, 'egg'],
        [2, 'egg'],
      ]),
    ).toEqual([]);
    expect(
      codes([
        [0, 'medium'],
        [3, 'unread'],
        [6, 'egg'],
      ]),
    ).toEqual(['relaid']);
  });

  it('has nothing to say of capped brood that is found dead', () => {
    expect(
      codes([
        [0, 'capped'],
        [5, 'parasitised'],
      ]),
    ).toEqual([]);
  });

  it('names the cell and keeps the tone', () => {
    const [flag] = flagsOf([
      [0, 'capped'],
      [2, 'egg'],
    ]);
    expect(flag?.cell).toEqual({ q: 0, r: 0 });
    expect(flag?.text).toMatch(/^Capped before, an egg now/);
  });
});
