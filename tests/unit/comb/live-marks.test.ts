import { describe, expect, it } from 'vitest';
import { liveMarks } from '@/lib/comb/live-marks';
import type { Mark } from '@/lib/comb/mark';
import { seededRandom } from '@/lib/kit/random';

function mark(opId: string, hlc: string, more: Partial<Mark> = {}): Mark {
  return {
    opId,
    hlc,
    q: 0,
    r: 0,
    state: 'egg',
    nectar: false,
    unsure: false,
    reused: false,
    scrap: false,
    instar: null,
    note: null,
    supersedes: null,
    at: '2026-06-16T05:41:07.120-04:00',
    ...more,
  };
}

const shown = (marks: Mark[], retracted: string[] = []) => liveMarks(marks, new Set(retracted)).map(({ opId }) => opId);

describe('the live mark of a cell', () => {
  it('is the one with the highest clock as integers, then operation id', () => {
    expect(shown([mark('b', '9.0'), mark('a', '10.0')])).toEqual(['a']);
    expect(shown([mark('a', '10.9'), mark('b', '10.10')])).toEqual(['b']);
    expect(shown([mark('b', '10.0'), mark('a', '10.0')])).toEqual(['b']);
  });

  it('is not one that a live mark supersedes, even with a higher clock', () => {
    expect(shown([mark('old', '20.0'), mark('new', '10.0', { supersedes: 'old' })])).toEqual(['new']);
  });

  it('comes back when what superseded it is taken back', () => {
    const marks = [mark('first', '1.0'), mark('second', '2.0', { supersedes: 'first' })];
    expect(shown(marks, ['second'])).toEqual(['first']);
    expect(shown(marks, ['first', 'second'])).toEqual([]);
  });

  it('follows a long chain of changed minds, one taken back at a time', () => {
    const chain = Array.from({ length: 5_000 }, (_, i) =>
      mark(`m${i}`, `${i}.0`, { supersedes: i === 0 ? null : `m${i - 1}` }),
    );
    expect(shown(chain)).toEqual(['m4999']);
    expect(shown(chain, ['m4999'])).toEqual(['m4998']);
  });

  it('is none when marks supersede each other in a ring', () => {
    expect(shown([mark('a', '1.0', { supersedes: 'b' }), mark('b', '2.0', { supersedes: 'a' })])).toEqual([]);
  });

  it('stands although the mark it supersedes never arrived', () => {
    expect(shown([mark('a', '1.0', { supersedes: 'lost' })])).toEqual(['a']);
  });

  it('does not depend on the order of arrival (200 shuffles, seed 16)', () => {
    const random = seededRandom(16);
    const marks = Array.from({ length: 40 }, (_, i) =>
      mark(`m${i}`, `${Math.floor(random() * 10)}.${Math.floor(random() * 3)}`, {
        q: i % 4,
        supersedes: i > 3 && random() < 0.4 ? `m${i - 4}` : null,
      }),
    );
    const expected = shown(marks, ['m7', 'm12', 'm38']);
    for (let round = 0; round < 200; round++) {
      const shuffled = [...marks].sort(() => random() - 0.5);
      expect(shown(shuffled, ['m7', 'm12', 'm38'])).toEqual(expected);
    }
  });
});
