import { localDate } from '@/lib/kit/local-date';
import type { BroodEstimate, BroodFlag } from './answer';
import type { DevelopmentClock } from './temperature/development-clock';

const NOTES: Readonly<Record<DevelopmentClock['kind'], string>> = {
  none: 'No temperature record is used: days are calendar days.',
  logger: 'Development follows the logger at the nest; outside its record days are calendar days.',
  daily: 'Development follows daily lowest and highest temperatures; outside their record days are calendar days.',
};

/** What the answer says about the temperature record. */
export function temperatureAnswer({ kind, from, to }: DevelopmentClock, zone: string): BroodEstimate['temperature'] {
  const date = (instant: number | null) => (instant === null ? null : localDate(instant, zone));
  return { kind, from: date(from), to: date(to), note: NOTES[kind] };
}

/** What the temperature record gives cause to say: heat, long gaps, no place for the sun. */
export function temperatureFlags({ warnings }: DevelopmentClock): BroodFlag[] {
  return warnings.map(({ code, text }) => ({ code, text }));
}
