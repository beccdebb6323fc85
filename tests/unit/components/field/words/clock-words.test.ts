import { expect, test } from 'vitest';
import { clockWords } from '@/components/field/words/clock-words';

const MINUTE = 60_000;

test.each([null, 0, 4.9 * MINUTE, -4.9 * MINUTE])('a clock that is off by %s ms is left alone', (skew) => {
  expect(clockWords(skew)).toBeNull();
});

test.each([
  [5 * MINUTE, '5 minutes slow'],
  [-14 * MINUTE, '14 minutes fast'],
  [60 * MINUTE, '60 minutes slow'],
  [3 * 60 * MINUTE, '3 hours slow'],
  [-26 * 60 * MINUTE, '26 hours fast'],
  [-365 * 24 * 60 * MINUTE, '365 days fast'],
])('one that is off by %i ms is said to be about %s', (skew, words) => {
  expect(clockWords(skew)).toBe(`This phone’s clock is about ${words}.`);
});
