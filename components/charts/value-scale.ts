const NICE = [1, 2, 5, 10] as const;

/**
 * The round number a value axis ends at, just above `value`: 1, 2 or 5 times a power of ten; never below 1,
 * because half an adult is not worth an axis.
 */
export function niceTop(value: number): number {
  if (value <= 1) return 1;
  const power = 10 ** Math.floor(Math.log10(value));
  const factor = NICE.find((nice) => nice * power >= value) ?? 10;
  return factor * power;
}
