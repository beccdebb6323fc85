import { countWords, dateWords, spanWords } from '@/components/ui/date-words';
import type { EmergenceDay } from './emergence-day';

/** The days worth drawing: from the first to the last on which anything at all is expected. */
export function busyDays(days: readonly EmergenceDay[]): EmergenceDay[] {
  const isBusy = (day: EmergenceDay): boolean => day.expected >= 0.005 || day.hi80 > 0;
  const [first, last] = [days.findIndex(isBusy), days.findLastIndex(isBusy)];
  return first === -1 ? [] : days.slice(first, last + 1);
}

/** The day by which a share of all adults is expected. */
function dayOfShare(days: readonly EmergenceDay[], wanted: number): string {
  let sum = 0;
  const day = days.find(({ expected }) => {
    sum += expected;
    return sum >= wanted;
  });
  return day?.date ?? days.at(-1)?.date ?? '';
}

/** The words that stand for the chart: how many adults are expected in all, and the days of the middle half of them. */
export function emergenceWords(days: readonly EmergenceDay[]): string {
  const total = days.reduce((sum, day) => sum + day.expected, 0);
  const [from, to] = [dayOfShare(days, total / 4), dayOfShare(days, (total * 3) / 4)];
  const many = `About ${countWords(Math.round(total), 'adult')} ${Math.round(total) === 1 ? 'is' : 'are'} expected`;
  return from === to
    ? `${many} in the days shown, half of them within the day of ${dateWords(from)}.`
    : `${many} in the days shown, half of them between ${spanWords([from, to])}.`;
}
