import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodInput, BroodMark, BroodReading } from '@/lib/brood/input';
import { DEFAULT_SETTINGS, type BroodSettings, type SettingName } from '@/lib/brood/settings';

/** The zone of the tests' nests. */
export const ZONE = 'America/New_York';

/** Runs of equal cells along the spiral walk: `cellsOf({ capped: 1, egg: 6 })`. */
export function cellsOf(counts: Partial<Record<CellState, number>>): BroodMark[] {
  const states = Object.entries(counts).flatMap(([state, count]) => Array<CellState>(count).fill(state as CellState));
  return spiral(states.length).map((cell, i) => ({ ...cell, state: states[i] ?? 'unread' }));
}

/** A reading of one state a cell along the spiral walk. */
export function reading(at: string, marks: readonly BroodMark[], id = at): BroodReading {
  return { id, at: Date.parse(at), marks };
}

/** An estimate of these readings, seen right after the last of them unless `asOf` says otherwise. */
export function estimate(readings: readonly BroodReading[], rest: Partial<BroodInput> = {}) {
  const asOf = Math.max(...readings.map(({ at }) => at));
  return estimateNest({ nest: 'nest', zone: ZONE, asOf, taxon: 'Polistes exclamans', readings, ...rest });
}

/** The default settings with some numbers replaced. */
export function settingsWith(values: Partial<Record<SettingName, number>>): BroodSettings {
  const replaced = Object.entries(values).map(([name, value]) => [
    name,
    { value, trust: 'assumption', source: 'test' },
  ]);
  return { ...DEFAULT_SETTINGS, values: { ...DEFAULT_SETTINGS.values, ...Object.fromEntries(replaced) } };
}

/**
 * Next to no spread, and nothing known from where a cell lies: the estimate comes close to arithmetic with the mean
 * durations. One brood a cell and a short search, because so little spread takes thousands of phases.
 */
export const NO_SPREAD = settingsWith({
  ...{ cvEgg: 0.05, cvInstar: 0.07, cvCapped: 0.05, nestFactorCv: 0 },
  ...{ generations: 1, orderSpread: 500, priorSpan: 60 },
});

/** Few phases: the same model, quick enough to be run hundreds of times. */
export const COARSE = settingsWith({ cvEgg: 0.4, cvInstar: 0.9, cvCapped: 0.4, generations: 2, priorSpan: 90 });
