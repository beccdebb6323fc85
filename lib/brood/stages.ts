import type { CellState } from '@/lib/comb/states';
import type { DurationRow } from './durations';
import type { BroodMark } from './input';
import type { BroodSettings } from './settings';

/** The seven stages of development in order. */
export const STAGES = ['egg', 'L1', 'L2', 'L3', 'L4', 'L5', 'pupa'] as const;

/** A stage as an Erlang law: so many equal phases, so many days in all. */
export interface StageLaw {
  phases: number;
  meanDays: number;
}

/** A run of neighbouring stages that one record can mean, as positions in `STAGES`. */
export interface StageGroup {
  key: string;
  first: number;
  last: number;
}

/** What the recorded classes mean: small is instars 1–3, medium instar 4, large instar 5, capped the pupa. */
const STATE_GROUPS: Partial<Record<CellState, StageGroup>> = {
  egg: { key: 'egg', first: 0, last: 0 },
  small: { key: 'small', first: 1, last: 3 },
  medium: { key: 'medium', first: 4, last: 4 },
  large: { key: 'large', first: 5, last: 5 },
  capped: { key: 'capped', first: 6, last: 6 },
};

/** Phases that give a coefficient of variation, to the nearest whole one: 0.16 → 39, 0.42 → 6. */
export function phasesFor(cv: number): number {
  return Math.max(1, Math.round(1 / (cv * cv)));
}

/** The seven stage laws of a taxon under the given settings. */
export function stageLaws(row: DurationRow, { values }: BroodSettings): StageLaw[] {
  const share5 = values.instar5Share.value;
  const instar = (share: number) => ({ phases: phasesFor(values.cvInstar.value), meanDays: row.larva * share });
  const early = Array.from({ length: 4 }, () => instar((1 - share5) / 4));
  return [
    { phases: phasesFor(values.cvEgg.value), meanDays: row.egg },
    ...early,
    instar(share5),
    { phases: phasesFor(values.cvCapped.value), meanDays: row.capped },
  ];
}

/**
 * The stages a mark can mean, or null when it shows no living brood.
 * An instar narrows a larva to that instar if it lies within the class that was recorded.
 */
export function stageGroup(mark: Pick<BroodMark, 'state' | 'instar'>): StageGroup | null {
  const group = STATE_GROUPS[mark.state] ?? null;
  if (!group || !mark.instar || !fitsInstar(mark)) return group;
  return { key: `L${mark.instar}`, first: mark.instar, last: mark.instar };
}

/** Does the instar belong to the recorded class? True when there is none to compare. */
export function fitsInstar({ state, instar }: Pick<BroodMark, 'state' | 'instar'>): boolean {
  const group = STATE_GROUPS[state];
  if (!instar) return true;
  return group !== undefined && group.first >= 1 && group.last <= 5 && instar >= group.first && instar <= group.last;
}
