import { expect, test } from 'vitest';
import { readCount } from '@/components/field/parts/read-count';
import { countedOf, countedQuery } from '@/components/field/recorder/counted-query';

test('a counted number survives the way to the recorder, and so does not having counted', () => {
  expect(countedOf(countedQuery(33))).toBe(33);
  expect(countedQuery(null)).toBe('');
  expect(countedOf('')).toBeNull();
});

test('a count is a whole number from 1, at most as large as the product takes', () => {
  expect(readCount(' 14 ')).toBe(14);
  expect(readCount('999999')).toBe(2_000);
  for (const text of ['', '0', '-3', '2.5', '1e3', 'many', '1234567']) expect(readCount(text)).toBeNull();
});
