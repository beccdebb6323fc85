import { type Result, err, ok } from '@/lib/kit/result';
import { type DailyExtremes, isPossible } from '@/lib/brood/temperature/record';

/** What somebody typed. */
interface TypedDay {
  date: string;
  min: string;
  max: string;
}

/** A temperature as people type it, with a comma or a point; null for anything else. */
function typedNumber(text: string): number | null {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  return /^-?\d+(\.\d+)?$/.test(plain) ? Number(plain) : null;
}

/** Reads a typed day, or says what is missing in it. */
export function readDayEntry({ date, min, max }: TypedDay): Result<DailyExtremes, string> {
  const [low, high] = [typedNumber(min), typedNumber(max)];
  if (!/^\d{4}-\d{2}-\d{2}$/.test(date)) return err('Choose the day.');
  if (low === null || high === null) return err('Give the lowest and the highest in °C, such as 12.5.');
  if (!isPossible(low) || !isPossible(high)) return err('A temperature at a nest lies between -40 and 70 °C.');
  if (low > high) return err('The lowest is above the highest.');
  return ok({ date, min: low, max: high });
}
