import type { TemperatureSettings } from './temperature-settings';

/** The part of the settings that a rate depends on. */
export type RateSettings = Pick<TemperatureSettings, 'base' | 'plateau' | 'limit' | 'reference'>;

/**
 * How fast brood develops at a temperature, in days of the durations per day: linear above the base, level above the
 * plateau, nothing above the limit, 1 at the reference.
 *
 * @param celsius brood temperature.
 * @throws RangeError when the reference does not lie between base and plateau: it would have no rate to be 1 at.
 */
export function developmentRate(celsius: number, { base, plateau, limit, reference }: RateSettings): number {
  if (reference <= base || reference > plateau) throw new RangeError('the reference lies outside base and plateau');
  if (celsius <= base || celsius > limit) return 0;
  return (Math.min(celsius, plateau) - base) / (reference - base);
}

/**
 * Mean rate over equally long pieces of time. The mean of the rates, never the rate of the mean: on warm days with
 * cold nights the two differ by half.
 *
 * @param temperatures one for the middle of each piece, °C; at least one.
 * @param rate the rate at a temperature.
 */
export function summedRate(temperatures: readonly number[], rate: (celsius: number) => number): number {
  return temperatures.reduce((sum, celsius) => sum + rate(celsius), 0) / temperatures.length;
}
