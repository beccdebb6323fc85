import { expect, it } from 'vitest';
import { groupBy } from '@/lib/kit/group-by';

it('sorts items into lists, keys and items in the order they came', () => {
  const groups = groupBy(['bee', 'ant', 'bug', 'ape'], (word) => word[0]);
  expect([...groups]).toEqual([
    ['b', ['bee', 'bug']],
    ['a', ['ant', 'ape']],
  ]);
});
