import { dateWords } from '@/components/ui/date-words';
import type { EmergenceDay } from './emergence-day';

/** The days worth drawing: from the first to the last on which anything at all is expected. */
export function busyDays(days: readonly EmergenceDay[]): EmergenceDay[] {
  const isBusy = (day: EmergenceDay): boolean => day.expected >= 0.005 || day.hi80 > 0;
  const [first, last] = [days.findIndex(isBusy), days.findLastIndex(isBusy)];
  return first === -1 ? [] : days.slice(first, last + 1);
}

/** The words that stand for the chart: when most adults are expected, and how many in all. */
export function emergenceWords(days: readonly EmergenceDay[]): string {
  const busiest = days.reduce((best, day) => (day.expected > best.expected ? day : best));
  const total = days.reduce((sum, day) => sum + day.expected, 0);
  return `About ${Math.round(total)} adults are expected in the days shown, most around ${dateWords(busiest.date)}.`;
}
