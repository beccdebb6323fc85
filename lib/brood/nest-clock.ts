import { DAY_MS } from './date-range';
import type { NestClock } from './nest-model/dated-nest';

/** Days count as days. */
const CALENDAR: NestClock = { between: () => 1, end: -Infinity };

/**
 * The development clock of a nest in days since an instant.
 *
 * @param rates `[from (epoch ms), rate]` in order, 1 before the first.
 * @param until what is measured after this instant is not known yet, so days count as days from there.
 */
export function nestClock(
  rates: readonly (readonly [number, number])[],
  { origin, until }: { origin: number; until: number },
): NestClock {
  const known = rates.filter(([from]) => from < until);
  if (known.length === 0) return CALENDAR;
  const last = known.at(-1)?.[1] ?? 1;
  const pieces = (last === 1 ? known : [...known, [until, 1] as const]).map(([from, rate]) => ({
    from: (from - origin) / DAY_MS,
    rate,
  }));
  let sum = pieces[0]?.from ?? 0;
  const sums = pieces.map(({ from }, i) => {
    const before = pieces[i - 1];
    if (before) sum += (from - before.from) * before.rate;
    return sum;
  });
  const developed = (day: number): number => {
    let [low, high] = [-1, pieces.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if ((pieces[middle]?.from ?? Infinity) <= day) low = middle;
      else high = middle - 1;
    }
    const piece = pieces[low];
    return piece ? (sums[low] ?? 0) + (day - piece.from) * piece.rate : day;
  };
  return {
    between: (from, to) => {
      const rate = (developed(to) - developed(from)) / (to - from);
      return Math.abs(rate - 1) < 1e-9 ? 1 : Math.max(0, rate);
    },
    end: pieces.at(-1)?.from ?? -Infinity,
  };
}
