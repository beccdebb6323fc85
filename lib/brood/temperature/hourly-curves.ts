/** One day's extremes and its sun, from which the temperature in between is drawn. */
export interface CurveDay {
  /** °C. */
  min: number;
  max: number;
  /** The lowest temperature of the night that follows, °C. */
  nextMin: number;
  /** Length of the day from sunrise to sunset, hours. */
  dayLength: number;
}

/** The temperature (°C) so many hours after sunrise; meant from about sunrise to the next sunrise. */
export type HourlyCurve = (day: CurveDay, hours: number) => number;

/**
 * Sine by day, logarithm by night; it reaches exactly the next minimum at the next sunrise, 24 hours later.
 *
 * @see Linvill 1990, HortScience 25:14-16; the form as read in an R package.
 */
export const linvill: HourlyCurve = ({ min, max, nextMin, dayLength }, hours) => {
  const byDay = (h: number) => min + (max - min) * Math.sin((Math.PI * h) / (dayLength + 4));
  if (hours <= dayLength) return byDay(hours);
  const sunset = byDay(dayLength);
  return sunset - ((sunset - nextMin) / Math.log(24 - dayLength + 1)) * Math.log(hours - dayLength + 1);
};

/** Air at 1.5 m: lag of the maximum, night coefficient and lag of the minimum, hours. From memory of the paper. */
const AIR = { a: 1.86, b: 2.2, c: -0.17 } as const;

/**
 * Sine by day, exponential by night; the night only comes near the next minimum.
 *
 * @see Parton & Logan 1981, Agricultural Meteorology 23:205-216.
 */
export const partonLogan: HourlyCurve = ({ min, max, nextMin, dayLength }, hours) => {
  const { a, b, c } = AIR;
  const byDay = (h: number) => min + (max - min) * Math.sin((Math.PI * (h - c)) / (dayLength + 2 * a));
  if (hours <= dayLength) return byDay(hours);
  const sunset = byDay(dayLength);
  const nightLength = 24 - dayLength;
  return nextMin + (sunset - nextMin) * Math.exp((-b * (hours - dayLength)) / nightLength);
};
