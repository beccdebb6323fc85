import type { CellState } from '@/lib/comb/states';
import type { DurationRow } from './durations';

/** Mean stage durations in days. */
export type StageDays = Pick<DurationRow, 'egg' | 'larva' | 'capped'>;

/** The stretch of a brood's life that one recorded class covers, in days of mean age. */
export interface StagePlace {
  state: CellState;
  from: number;
  to: number;
}

/**
 * Where larval classes part, as shares of the larval time: small (instars 1–3) up to a half, medium (instar 4) up to
 * two thirds, large (instar 5) the rest; the product's default, an assumption.
 */
const SMALL_UNTIL = 1 / 2;
const MEDIUM_UNTIL = 2 / 3;

/** The recorded classes of living brood in the order they follow each other, and the opened cell at the end. */
export function stagePlaces({ egg, larva, capped }: StageDays): StagePlace[] {
  const [small, medium] = [egg + larva * SMALL_UNTIL, egg + larva * MEDIUM_UNTIL];
  const [cap, out] = [egg + larva, egg + larva + capped];
  return [
    { state: 'egg', from: 0, to: egg },
    { state: 'small', from: egg, to: small },
    { state: 'medium', from: small, to: medium },
    { state: 'large', from: medium, to: cap },
    { state: 'capped', from: cap, to: out },
    { state: 'opened', from: out, to: Number.POSITIVE_INFINITY },
  ];
}
