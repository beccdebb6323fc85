import { describe, expect, test } from 'vitest';
import { surprisingChange } from '@/lib/brood/surprising-change';
import type { CellState } from '@/lib/comb/states';

// Rabb 1960 (Ann Entomol Soc Am 53:111-121): egg 11, larva 20, capped 14 days.
const RABB = { egg: 11, larva: 20, capped: 14 };
const judge = (from: CellState, to: CellState, days: number) => surprisingChange({ from, to, days }, RABB);

describe('a change that is asked about', () => {
  test.each([
    ['capped', 'egg', 2, 'younger'],
    ['capped', 'large', 3, 'younger'],
    ['large', 'small', 3, 'younger'],
    ['medium', 'small', 1, 'younger'],
    ['large', 'egg', 1, 'younger'],
    ['egg', 'capped', 5, 'fast'],
    ['egg', 'large', 2, 'fast'],
    ['empty', 'large', 4, 'fast'],
    ['empty', 'opened', 10, 'fast'],
    ['small', 'opened', 5, 'fast'],
  ] as const)('%s to %s within %i days is %s', (...[from, to, days, surprise]) => {
    expect(judge(from, to, days)).toBe(surprise);
  });
});

describe('a change that is taken as it is', () => {
  test.each([
    ['egg', 'egg', 0],
    ['egg', 'small', 3],
    ['small', 'medium', 2],
    ['large', 'capped', 1],
    ['capped', 'opened', 3],
    ['capped', 'egg', 8],
    ['capped', 'empty', 2],
    ['large', 'egg', 3],
    ['large', 'small', 20],
    ['empty', 'egg', 0],
    ['opened', 'egg', 1],
    ['opened', 'opened', 3],
    ['large', 'webbed', 1],
    ['unread', 'capped', 1],
    ['large', 'dead', 1],
  ] as const)('%s to %s within %i days', (from, to, days) => {
    expect(judge(from, to, days)).toBeNull();
  });
});
