import { describe, expect, it } from 'vitest';
import { DEFAULT_DURATIONS, GENUS_ROW, durationsFor } from '@/lib/brood/durations';
import { combCurve } from '@/lib/brood/nest-model/building';
import { DEFAULT_SETTINGS, SETTING_RULES } from '@/lib/brood/settings';
import { stageLaws } from '@/lib/brood/stages';
import { massesAt } from './stage-rows';

/** The first day back from a count at which a comb that grew evenly had no cell. */
function daysBackToNothing(cells: number, perDay: number): number {
  const curve = combCurve([{ day: 0, cells }], perDay);
  let [low, high] = [-400, 0];
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (curve(middle) > 0) high = middle;
    else low = middle;
  }
  return -high;
}

const { values } = DEFAULT_SETTINGS;

describe('published growth of combs (P rows: biology)', () => {
  it.each([
    [40, 0.952],
    [50, 1.19],
  ])(
    'P C07: %d cells at 42 days are %d a day, and the default lies between the two (Enteman 1902)',
    (cells, perDay) => {
      expect(Math.abs(cells / 42 - perDay)).toBeLessThan(0.005);
      expect(Math.abs(daysBackToNothing(cells, cells / 42) - 42)).toBeLessThan(1e-6);
      expect(Math.sign(perDay - values.cellsPerDay.value)).toBe(cells === 40 ? -1 : 1);
    },
  );

  it('P C08: Vespula queen nests grow 62.2 cells in 32.7 and 71.3 in 25.8 days (Matthews et al. 1982)', () => {
    expect(Math.abs(daysBackToNothing(62.2, 1.9) - 32.7)).toBeLessThan(0.1);
    const germanica = daysBackToNothing(71.3, 2.76);
    expect(Math.abs(germanica - 25.8)).toBeLessThan(0.1);
    // Egg to adult of V. germanica in an environment chamber, same source.
    expect(Math.abs(germanica - 27.4)).toBeLessThan(2);
  });
});

describe('published yields that the numbers of the model must leave room for (P rows: biology)', () => {
  /** P(an egg laid in a field nest gives an adult) under the default losses. */
  const survival = () => {
    const { egg, larva, capped } = durationsFor('Polistes', DEFAULT_DURATIONS).row;
    return Math.exp(-egg * values.lossEgg.value - larva * values.lossLarva.value - capped * values.lossCapped.value);
  };

  it.each([
    { nests: 'P. versicolor (Oliveira et al. 2010)', adults: 171.67, cells: 244.2, ratio: 0.703 },
    { nests: 'M. consimilis (Montagna et al. 2010)', adults: 40.7, cells: 72.9, ratio: 0.558 },
    { nests: 'Parapolybia indica (Mie, Japan, 1976–81)', adults: 69.2, cells: 163.7, ratio: 0.423 },
  ])('P C09: $nests: $adults adults from $cells cells are $ratio a cell, within what one can yield here', (row) => {
    expect(Math.abs(row.adults / row.cells - row.ratio)).toBeLessThan(0.002);
    expect(row.ratio).toBeLessThan(values.generations.value * survival());
  });

  it('P C09: up to six adults came out of one cell of P. versicolor, and six broods can be set (Oliveira et al. 2010)', () => {
    expect(SETTING_RULES.generations.max).toBeGreaterThanOrEqual(6);
  });

  it('P C10: Parapolybia indica lays 1.286 eggs a cell, more than one brood, and 0.329 become adults, fewer than the default losses leave', () => {
    expect(Math.abs(210.6 / 163.7 - 1.286)).toBeLessThan(0.002);
    expect(Math.abs(69.2 / 210.6 - 0.329)).toBeLessThan(0.002);
    expect(values.generations.value).toBeGreaterThan(210.6 / 163.7);
    expect(survival()).toBeGreaterThan(0.329);
  });
});

describe('arithmetic on the default durations (M rows: coded as written, no biology)', () => {
  it('M C11: 1.20, 0.39 and 1.00 cells a day over egg, larva and capped time make 35.0 cells at the first adult', () => {
    const { egg, larva, capped } = durationsFor('Polistes exclamans', DEFAULT_DURATIONS).row;
    const parts = [1.2 * egg, 0.39 * larva, 1 * capped];
    parts.forEach((cells, i) => expect(cells).toBeCloseTo([13.2, 7.8, 14][i] ?? NaN, 10));
    const counts = [egg, egg + larva, egg + larva + capped].map((day, i) => ({
      day,
      cells: parts.slice(0, i + 1).reduce((sum, cells) => sum + cells, 0),
    }));
    const curve = combCurve(counts, 1);
    expect(Math.abs(curve(45) - 35)).toBeLessThan(0.1);
    // Straight between counts: half of the larval time adds half of its cells.
    expect(curve(egg + larva / 2)).toBeCloseTo(13.2 + 3.9, 10);
  });

  it('M C25: steady laying without loss leaves 24.4 % eggs, 44.4 % larvae and 31.1 % capped', () => {
    const laws = stageLaws(GENUS_ROW, DEFAULT_SETTINGS);
    const starts = laws.reduce<number[]>((all, { phases }) => [...all, (all.at(-1) ?? 0) + phases], [0]);
    const shares = [0, 0, 0];
    // Ages are spread evenly when eggs are laid evenly: the mean over all ages of what an egg has become.
    for (let age = 0.5; age < 120; age++) {
      const masses = massesAt(laws, age);
      [
        [0, 1],
        [1, 6],
        [6, 7],
      ].forEach(([from = 0, to = 0], i) => {
        for (const p of masses.subarray(starts[from], starts[to])) shares[i] = (shares[i] ?? 0) + p / 45;
      });
    }
    [0.244, 0.444, 0.311].forEach((share, i) => expect(Math.abs((shares[i] ?? NaN) - share)).toBeLessThan(0.001));
  });

  it('M C29: spreads of 1.3, 4.0 and 1.4 days add up to 4.43, with 9 shared to 10.04; those in force to 4.79', () => {
    expect(Math.abs(Math.hypot(1.3, 4, 1.4) - 4.43)).toBeLessThan(0.01);
    expect(Math.abs(Math.hypot(1.3, 4, 1.4, 9) - 10.04)).toBeLessThan(0.02);
    // An Erlang stage of k phases has a standard deviation of its mean over the root of k.
    const own = stageLaws(GENUS_ROW, DEFAULT_SETTINGS).map(({ phases, meanDays }) => meanDays / Math.sqrt(phases));
    expect(Math.abs(Math.hypot(...own) - 4.79)).toBeLessThan(0.01);
    expect(values.nestFactorCv.value * 45).toBeCloseTo(9, 10);
  });
});

describe('published figures that no code uses, kept right for those who read them (P rows: biology)', () => {
  it('P C12: head capsules growing by 1.44 a moult stand as 1 : 1.440 : 2.074 : 2.986 : 4.300 (Prezoto & Gobbi 2005)', () => {
    [1, 1.44, 2.074, 2.986, 4.3].forEach((width, i) => expect(Math.abs(1.44 ** i - width)).toBeLessThan(0.001));
  });

  it.each([
    [13.2, 2.05, 'P. lanio, Silva-Filho et al. 2020'],
    [0.73, 0.482, 'Ropalidia marginata, Mandal & Gadagkar 2015'],
    [6.22, 1.407, 'Ropalidia marginata, Mandal & Gadagkar 2015'],
  ])('P C26: a round homing area of %d km² has a radius of %d km (%s)', (area, radius) => {
    expect(Math.abs(Math.sqrt(area / Math.PI) - radius)).toBeLessThan(0.005);
  });

  it('P C27: 149 to 802 nl of CO₂ over 20 to 35 °C is a Q10 of 3.07 (Käfer et al. 2015)', () => {
    expect(Math.abs((802 / 149) ** (10 / 15) - 3.07)).toBeLessThan(0.01);
  });
});
