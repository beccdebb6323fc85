import 'server-only';
import type { CombStory } from '@/lib/server/demo/build/comb-of';

/** What was measured at the take-down of one nest. */
export interface MeasuredNest {
  comb: CombStory;
  /** Longest and shortest diameter. */
  combMm: readonly [number, number];
  pedicelMm: number;
  /** Air at the nest; null where nobody measured. */
  tempC: number | null;
  /** Adult females on the nest. */
  adults: number;
}

/**
 * The take-down figures of every nest that was read, except N12, whose cells are given one by one.
 * `lean` is where the comb's middle lies from its pedicel, in cell widths: few combs are round about their stalk.
 */
export const MOVED_NESTS = {
  N01: {
    comb: { counts: { egg: 10, small: 3, empty: 1 }, nectar: 2, lean: { x: 0.6, y: 0.4 } },
    combMm: [24, 21],
    pedicelMm: 9,
    tempC: 9,
    adults: 1,
  },
  N02: {
    comb: { counts: { egg: 9, small: 5, medium: 2, empty: 3 }, nectar: 3, lean: { x: -0.7, y: 0.5 } },
    combMm: [29, 25],
    pedicelMm: 8,
    tempC: 11,
    adults: 1,
  },
  N03: {
    comb: { counts: { egg: 9, small: 6, medium: 3, large: 3, empty: 2 }, nectar: 4, lean: { x: 0.3, y: 0.9 } },
    combMm: [33, 27],
    pedicelMm: 7,
    tempC: 17,
    adults: 1,
  },
  N06: {
    comb: { counts: { egg: 15, small: 8, medium: 4, large: 4, empty: 3 }, nectar: 5, lean: { x: 0.9, y: -0.3 } },
    combMm: [41, 34],
    pedicelMm: 10,
    tempC: 12,
    adults: 2,
  },
  N09: {
    comb: {
      counts: { egg: 9, small: 5, medium: 3, large: 5, capped: 2, damaged: 3, empty: 1 },
      nectar: 1,
      lean: { x: -0.5, y: -0.4 },
    },
    combMm: [37, 30],
    pedicelMm: 8,
    tempC: 13,
    adults: 1,
  },
  N10: {
    comb: { counts: { egg: 6, capped: 5, dead: 12, empty: 6 }, nectar: 0, lean: { x: 0.2, y: 0.6 } },
    combMm: [38, 31],
    pedicelMm: 8,
    tempC: null,
    adults: 0,
  },
  N11: {
    comb: {
      counts: { egg: 10, small: 6, medium: 4, large: 5, capped: 4, empty: 2 },
      nectar: 1,
      lean: { x: -0.8, y: 0.2 },
    },
    combMm: [39, 33],
    pedicelMm: 11,
    tempC: 14,
    adults: 1,
  },
} as const satisfies Record<string, MeasuredNest>;

/** What was measured beside the 33 cells of N12. */
export const N12_MEASURED: Omit<MeasuredNest, 'comb'> = { combMm: [40, 35], pedicelMm: 9, tempC: 15, adults: 1 };
