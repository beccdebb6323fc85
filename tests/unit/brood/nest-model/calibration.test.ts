import { beforeAll, describe, expect, it } from 'vitest';
import type { Confusion } from '@/lib/brood/hmm/emission';
import { CELL_CLASSES, DEFAULT_CONFUSION } from '@/lib/brood/nest-model/confusion';
import { calibrate, chiSquare, coverage } from './calibration';

const isLong = process.env.LONG === '1';
const NESTS = isLong ? 2_000 : 400;
const CONTROL_NESTS = isLong ? 2_000 : 200;
const MINUTES = 60_000;

/** 0.999 quantile of χ² with 19 degrees of freedom. */
const CHI_SQUARE = 43.82;

/** Binomial bands of 0.1 % for the coverage of central intervals (sbc_reference.json of the method's authors' run). */
const BANDS = isLong
  ? ([
      [0.5, 0.463, 0.537],
      [0.8, 0.77, 0.829],
      [0.95, 0.9335, 0.9655],
    ] as const)
  : ([
      [0.5, 0.4175, 0.5825],
      [0.8, 0.7325, 0.8625],
      [0.95, 0.91, 0.9825],
    ] as const);

/** Every row as a reader with three times the slips fills it. */
function tripled(confusion: Confusion): Confusion {
  const rows = Object.entries(confusion).map(([name, row]) => {
    const right = CELL_CLASSES[name]?.recorded ?? name;
    const entries = Object.entries(row).map(([seen, p]) => [seen, seen === right ? 1 - 3 * (1 - p) : 3 * p]);
    return [name, Object.fromEntries(entries)];
  });
  return Object.fromEntries(rows);
}

/** Every class recorded as what it is. */
const IDENTITY: Confusion = Object.fromEntries(
  Object.entries(CELL_CLASSES).map(([name, { recorded }]) => [name, { [recorded]: 1 }]),
);

function faults(places: readonly number[]): string[] {
  const square = chiSquare(places);
  const outside = BANDS.filter(([mass, low, high]) => {
    const share = coverage(places, mass);
    return share < low || share > high;
  });
  return [
    ...(square < CHI_SQUARE ? [] : [`χ² ${square.toFixed(1)}`]),
    ...outside.map(([mass]) => `coverage of ${mass}: ${coverage(places, mass)}`),
  ];
}

describe(
  `calibration by simulated nests (Talts et al. 2018), ${NESTS} nests, seed 2026`,
  { timeout: 60 * MINUTES },
  () => {
    let places: { laid: number[]; capped: number[] };

    beforeAll(() => {
      places = calibrate({ truth: DEFAULT_CONFUSION, believed: DEFAULT_CONFUSION, seed: 2026 }, NESTS);
    }, 60 * MINUTES);

    it('puts the true laying time evenly into the estimated law', () => {
      expect(places.laid).toHaveLength(NESTS);
      expect(faults(places.laid)).toEqual([]);
    });

    it('puts the true capping time evenly into the estimated law', () => {
      expect(places.capped).toHaveLength(NESTS);
      expect(faults(places.capped)).toEqual([]);
    });

    it(`fails where it must: three times the slips, analysed as if nobody ever slipped (${CONTROL_NESTS} nests, seed 7)`, () => {
      const control = calibrate({ truth: tripled(DEFAULT_CONFUSION), believed: IDENTITY, seed: 7 }, CONTROL_NESTS);
      expect([...faults(control.laid), ...faults(control.capped)]).not.toEqual([]);
    });
  },
);
