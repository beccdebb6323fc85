import { expect, test } from 'vitest';
import { writtenOn, writtenTime } from '@/components/field/words/written-time';

const WRITTEN = '2026-06-16T05:41:07.120-04:00';

test('a time is shown as the clock showed it, whatever the offset', () => {
  expect(writtenTime(WRITTEN, '2026-06-16')).toBe('today, 05:41');
  expect(writtenTime(WRITTEN, '2026-06-17')).toBe('yesterday, 05:41');
  expect(writtenTime(WRITTEN, '2026-07-01')).toBe('16 June, 05:41');
  expect(writtenTime(WRITTEN, '2027-01-02')).toBe('16 June 2026, 05:41');
});

test('yesterday is found over the end of a month', () => {
  expect(writtenTime('2026-06-30T23:59:00.000+02:00', '2026-07-01')).toBe('yesterday, 23:59');
});

test('what is no time is shown as it is', () => {
  expect(writtenTime('unknown', '2026-06-16')).toBe('unknown');
});

test('a date is compared with the written one', () => {
  expect(writtenOn(WRITTEN, '2026-06-16')).toBe(true);
  expect(writtenOn(WRITTEN, '2026-06-17')).toBe(false);
  expect(writtenOn(null, '2026-06-16')).toBe(false);
});
