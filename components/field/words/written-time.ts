import { dateWords } from '@/components/ui/date-words';
import { addDays } from '@/lib/kit/local-date';

const WRITTEN = /^(\d{4}-\d{2}-\d{2})T(\d{2}:\d{2})/;

/**
 * A time as the person's own clock showed it: `today, 05:41`, `yesterday, 05:41`, `16 June, 05:41`, with the year when
 * it is another one. The offset in the text is not applied again: what was written is what is shown.
 *
 * @param written ISO 8601 with offset.
 * @param today local date of the reader, `YYYY-MM-DD`.
 * @returns the text itself when it is no such time.
 */
export function writtenTime(written: string, today: string): string {
  const match = WRITTEN.exec(written);
  if (!match) return written;
  const [, date = '', time = ''] = match;
  if (date === today) return `today, ${time}`;
  if (date === addDays(today, -1)) return `yesterday, ${time}`;
  return `${dateWords(date, today)}, ${time}`;
}

/** Was this written on the given local date? */
export function writtenOn(written: string | null, date: string): boolean {
  return written !== null && written.startsWith(date);
}
