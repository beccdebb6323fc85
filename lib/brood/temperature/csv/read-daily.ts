import type { DailyExtremes } from '@/lib/brood/temperature/record';
import type { FileNote } from './file-note';
import { type ReadingRules, celsiusOf, dateOf } from './read-lines';
import type { ReadValues } from './read-logger';
import type { FileLine } from './split-cells';

function swapped(line: number): FileNote {
  const text = `Line ${line}: the lowest is above the highest; left out.`;
  return { code: 'impossible', line, text };
}

function readDay(
  line: FileLine,
  rules: ReadingRules,
  { min, max }: { min: number; max: number },
): DailyExtremes | FileNote {
  const parts = { date: dateOf(line, rules), min: celsiusOf(line, min, rules), max: celsiusOf(line, max, rules) };
  if (!parts.date.ok) return parts.date.error;
  if (!parts.min.ok) return parts.min.error;
  if (!parts.max.ok) return parts.max.error;
  if (parts.min.value > parts.max.value) return swapped(line.number);
  return { date: parts.date.value, min: parts.min.value, max: parts.max.value };
}

function repeated(line: number, { min, max }: DailyExtremes, kept: DailyExtremes): FileNote {
  const isSame = min === kept.min && max === kept.max;
  const text = `Line ${line}: ${kept.date} stands above already${isSame ? '' : ' with other values, which are kept'}; left out.`;
  return { code: isSame ? 'duplicate' : 'duplicate-differs', line, text };
}

/** Reads lines of daily extremes in the order of dates, each date once; the first line of a date is kept. */
export function readDaily(
  body: readonly FileLine[],
  rules: ReadingRules,
  extremes: { min: number; max: number },
): ReadValues<DailyExtremes> {
  const days = new Map<string, DailyExtremes>();
  const notes: FileNote[] = [];
  let latest = '';
  for (const line of body) {
    const day = readDay(line, rules, extremes);
    if ('code' in day) {
      notes.push(day);
      continue;
    }
    const kept = days.get(day.date);
    if (kept) notes.push(repeated(line.number, day, kept));
    else days.set(day.date, day);
    if (day.date < latest) {
      const text = `Line ${line.number}: earlier than the line before; put where it belongs.`;
      notes.push({ code: 'out-of-order', line: line.number, text });
    }
    latest = day.date > latest ? day.date : latest;
  }
  return { values: [...days.values()].sort((a, b) => (a.date < b.date ? -1 : 1)), notes };
}
