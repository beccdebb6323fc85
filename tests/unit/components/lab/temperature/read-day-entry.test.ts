import { describe, expect, it } from 'vitest';
import { readDayEntry } from '@/components/lab/temperature/read-day-entry';
import { POSSIBLE_C, isPossible } from '@/lib/brood/temperature/record';

describe('a day noted by hand', () => {
  it('is read with a comma or a point', () => {
    const read = readDayEntry({ date: '2026-06-04', min: ' 12,5', max: '27.0' });
    expect(read).toEqual({ ok: true, value: { date: '2026-06-04', min: 12.5, max: 27 } });
  });

  it.each([
    [{ date: '', min: '12', max: '25' }, 'Choose the day.'],
    [{ date: '2026-06-04', min: 'cold', max: '25' }, 'Give the lowest and the highest in °C, such as 12.5.'],
    [{ date: '2026-06-04', min: '25', max: '12' }, 'The lowest is above the highest.'],
    [{ date: '2026-06-04', min: '12', max: '120' }, 'A temperature at a nest lies between -40 and 70 °C.'],
  ])('%o is sent back: %s', (typed, error) => {
    expect(readDayEntry(typed)).toEqual({ ok: false, error });
  });

  it('lies within what a thermometer at a nest can show, both ends included', () => {
    const { min, max } = POSSIBLE_C;
    expect([min, max, min - 0.1, max + 0.1].map(isPossible)).toEqual([true, true, false, false]);
  });
});
