import { describe, expect, it } from 'vitest';
import {
  axisWords,
  countWords,
  dateWords,
  dayWords,
  fullDateWords,
  momentWords,
  rangeWords,
  runWords,
  spanWords,
} from '@/components/ui/date-words';

const NEW_YORK = 'America/New_York';

describe('dates in words', () => {
  it('says the day and month, and the year only when it is not the reader’s', () => {
    expect(dateWords('2026-05-06')).toBe('6 May');
    expect(dateWords('2026-05-06', '2026')).toBe('6 May');
    expect(dateWords('2026-05-06', '2027-01-02')).toBe('6 May 2026');
    expect(fullDateWords('2026-12-31')).toBe('31 December 2026');
  });

  it('shortens months on the axis of a chart', () => {
    expect(axisWords('2026-06-23')).toBe('23 Jun');
  });

  it('says an instant in the zone of the nest, on the other side of midnight too', () => {
    expect(momentWords('2026-06-16T05:41:07.120-04:00', NEW_YORK)).toBe('16 June, 05:41');
    expect(momentWords(Date.parse('2026-06-17T03:59:00Z'), NEW_YORK, '2025')).toBe('16 June 2026, 23:59');
    expect(dayWords('2026-06-17T03:59:00Z', NEW_YORK)).toBe('16 June');
  });
});

describe('ranges in words', () => {
  it('says a shared month once', () => {
    expect(spanWords(['2026-06-18', '2026-06-29'])).toBe('18 and 29 June');
  });

  it('says two months of one year', () => {
    expect(spanWords(['2026-04-29', '2026-05-13'])).toBe('29 April and 13 May');
  });

  it('says both years across New Year', () => {
    expect(spanWords(['2026-12-30', '2027-01-02'])).toBe('30 December 2026 and 2 January 2027');
  });

  it('says the year of a range in another year than the reader’s', () => {
    expect(spanWords(['2025-06-18', '2025-06-29'], '2026')).toBe('18 and 29 June 2025');
  });

  it('never leaves an estimate as a bare date', () => {
    expect(rangeWords('2026-05-06', ['2026-04-29', '2026-05-13'])).toEqual({
      day: '6 May',
      range: 'between 29 April and 13 May',
    });
    expect(rangeWords('2026-05-06', ['2026-05-06', '2026-05-06']).range).toBe('within the day');
  });
});

describe('numbers in words', () => {
  it('counts one thing and several', () => {
    expect(countWords(1, 'cell')).toBe('1 cell');
    expect(countWords(0, 'cell')).toBe('0 cells');
    expect(countWords(2, 'box', 'boxes')).toBe('2 boxes');
  });

  it('joins neighbouring numbers into runs', () => {
    expect(runWords([5, 0, 2, 1])).toBe('0–2, 5');
    expect(runWords([3, 4])).toBe('3, 4');
    expect(runWords([9])).toBe('9');
    expect(runWords([])).toBe('');
  });
});
