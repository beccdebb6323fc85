import { describe, expect, it } from 'vitest';
import type { BroodEstimate, DateRange } from '@/lib/brood/answer';
import type { BroodInput } from '@/lib/brood/input';
import type { BroodSettings } from '@/lib/brood/settings';
import { COARSE, NO_SPREAD, cellsOf, estimate, reading, settingsWith } from '@/tests/unit/brood/support';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
const LAST = Date.parse('2026-06-20T12:00:00Z');
const READINGS = [
  reading('2026-06-05T12:00:00Z', cellsOf({ large: 1, small: 2, egg: 1 })),
  reading('2026-06-20T12:00:00Z', cellsOf({ capped: 1, medium: 2, egg: 2 })),
];

/** A logger beside the nest that shows one temperature for 150 days before the last visit. */
function constant(celsius: number): NonNullable<BroodInput['temperature']> {
  const hours = 150 * 24;
  const readings = Array.from({ length: hours + 1 }, (_, i) => ({ at: LAST - (hours - i) * HOUR_MS, celsius }));
  return { kind: 'logger', readings };
}

const dated = (rest: Partial<BroodInput> = {}) => estimate(READINGS, { settings: COARSE, zone: 'UTC', ...rest });

/** Median of a range in days since the last visit. */
const median = (range: DateRange | null | undefined) => (Date.parse(range?.utc.median ?? '') - LAST) / DAY_MS;

/** How the middle of all laying dates lies, in days since the last visit. */
function layings({ cells }: BroodEstimate): number[] {
  return cells.flatMap(({ laid }) => (laid ? [median(laid)] : []));
}

describe('the temperature of a nest', { timeout: 60_000 }, () => {
  const calendar = dated();

  it('M: a constant 25 °C gives every cell and the nest the dates of the reference clock', () => {
    const warm = dated({ temperature: constant(25) });
    expect(warm.cells).toEqual(calendar.cells);
    expect(warm.nest).toEqual(calendar.nest);
  });

  it('M: the cooler it was, the earlier everything must have been laid', () => {
    const medians = [30, 25, 18].map((celsius) => layings(dated({ temperature: constant(celsius) })));
    medians.slice(1).forEach((cooler, i) => {
      cooler.forEach((day, cell) => expect(day).toBeLessThan(medians[i]?.[cell] ?? NaN));
    });
  });

  it('M C18: a capped cell at a constant 20 °C was laid 46.5 to 67.5 days ago, not 31 to 45', () => {
    const settings: BroodSettings = {
      ...NO_SPREAD,
      values: { ...NO_SPREAD.values, priorSpan: { ...NO_SPREAD.values.priorSpan, value: 75 } },
    };
    const capped = [reading('2026-06-20T12:00:00Z', cellsOf({ capped: 1 }))];
    const { cells } = estimate(capped, { settings, zone: 'UTC', temperature: constant(20) });
    const [from, to] = cells[0]?.laid?.utc.p95.map((at) => (Date.parse(at) - LAST) / DAY_MS) ?? [];
    expect(Math.abs((from ?? NaN) + 67.5)).toBeLessThan(2);
    expect(Math.abs((to ?? NaN) + 46.5)).toBeLessThan(2);
  });

  it.each([10, 5])(
    'M C19: at a constant %d °C nothing develops, and the estimate still ends, with finite dates',
    (celsius) => {
      const { cells, nest } = dated({ temperature: constant(celsius) });
      const ranges = [...cells.flatMap(({ laid, emerges }) => [laid, emerges]), nest.founded].filter(
        (range) => range !== null,
      );
      expect(ranges.length).toBeGreaterThan(0);
      expect(ranges.every((range) => Number.isFinite(median(range)))).toBe(true);
    },
  );

  it('M C20: a constant 35 °C gives the dates of 33 °C', () => {
    const [hot, warm] = [35, 33].map((celsius) => dated({ temperature: constant(celsius) }));
    expect(hot?.cells).toEqual(warm?.cells);
    expect(hot?.nest).toEqual(warm?.nest);
  });
});

describe('what a team has learnt of how fast its nests are', () => {
  const factor = (taxon: string, logMean: number, logSd = 0) => ({
    ...{ taxon, logMean, logSd },
    ...{ trust: 'assumption' as const, source: 'test' },
  });
  const STIFF = settingsWith({
    cvEgg: 0.4,
    cvInstar: 0.9,
    cvCapped: 0.4,
    generations: 2,
    priorSpan: 90,
    nestFactorCv: 0,
  });

  it('M: nests known to be exactly e^0.2 as fast are dated as if every stage were that much shorter', () => {
    const learnt = { ...STIFF, durationFactors: [factor('Polistes exclamans', 0.2)] };
    const row = STIFF.durations.find(({ taxon }) => taxon === 'Polistes exclamans');
    const short = (days = NaN) => days * Math.exp(-0.2);
    const shorter = {
      ...STIFF,
      durations: row ? [{ ...row, egg: short(row.egg), larva: short(row.larva), capped: short(row.capped) }] : [],
    };
    const [a, b] = [learnt, shorter].map((settings) => layings(dated({ settings })));
    a?.forEach((day, i) => expect(Math.abs(day - (b?.[i] ?? NaN))).toBeLessThan(0.01));
    expect(a).toHaveLength(5);
  });

  it('M: faster nests are laid later and come out earlier', () => {
    const [slow, fast] = [-0.3, 0.3].map((logMean) =>
      dated({ settings: { ...STIFF, durationFactors: [factor('Polistes exclamans', logMean)] } }),
    );
    expect(median(fast?.cells[0]?.laid)).toBeGreaterThan(median(slow?.cells[0]?.laid));
    expect(median(fast?.cells[0]?.emerges)).toBeLessThan(median(slow?.cells[0]?.emerges));
  });

  it('leaves nests of other taxa alone', () => {
    const settings = { ...STIFF, durationFactors: [factor('Polistes fuscatus', 0.4)] };
    expect(dated({ settings }).cells).toEqual(dated({ settings: STIFF }).cells);
  });

  it('M: the less the team’s nests differ, the less the readings move the factor', () => {
    const widths = [0.02, 0.3].map((logSd) => {
      const settings = { ...STIFF, durationFactors: [factor('Polistes exclamans', 0, logSd)] };
      const [from, to] = dated({ settings }).nest.rateMultiplier.p95;
      return to - from;
    });
    expect(widths[0]).toBeLessThan(0.1);
    expect(widths[1]).toBeGreaterThan(0.2);
  });
});
