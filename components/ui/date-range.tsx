import type { ReactElement } from 'react';
import { rangeWords, type YearShown } from './date-words';

interface DateRangeWordsProps {
  median: string;
  ends: readonly [string, string];
  inYear?: YearShown;
}

/** An estimated date in words: **6 May**, between 29 April and 13 May. */
export function DateRangeWords({ median, ends, inYear }: DateRangeWordsProps): ReactElement {
  const { day, range } = rangeWords(median, ends, inYear);
  return (
    <span>
      <strong className="whitespace-nowrap">{day}</strong>, {range}
    </span>
  );
}
