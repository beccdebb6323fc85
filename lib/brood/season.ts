import { daysBetween } from '@/lib/kit/local-date';
import type { DateRange, Season } from './answer';
import type { BroodSettings } from './settings';

/** What the gate looks at. */
interface GateInput {
  /** Adults have come out already. */
  isPast: boolean;
  firstEmergence: DateRange | null;
  /** Local date of the nest. */
  today: string;
}

/** Whole days from today to the median first emergence; negative when that date has gone by. */
export function daysToEmergence({ firstEmergence, today }: Pick<GateInput, 'firstEmergence' | 'today'>): number | null {
  return firstEmergence ? daysBetween(today, firstEmergence.median) : null;
}

/**
 * The season gate (programme default): green from founding on, amber in the last days before the estimated first
 * emergence, red once workers are out or that date has come, grey when nothing can be dated.
 */
export function seasonGate(input: GateInput, { values }: BroodSettings): Season {
  if (input.isPast) return 'red';
  const days = daysToEmergence(input);
  if (days === null) return 'grey';
  if (days <= values.redWindow.value) return 'red';
  return days <= values.amberWindow.value ? 'amber' : 'green';
}
