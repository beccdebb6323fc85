import type { CellState } from '@/lib/comb/states';
import type { BroodMark } from '@/lib/brood/input';
import { type Confusion, likelihoodOf } from '@/lib/brood/hmm/emission';
import { fitsInstar } from '@/lib/brood/stages';
import type { BroodModel } from './brood-model';
import { CELL_CLASSES, RECORDED_CLASSES } from './confusion';

/** One look into a cell: what it was recorded as; `absent` where the reading shows that it was not there. */
export interface Look {
  state: CellState | 'absent';
  instar: number | null;
  unsure: boolean;
  reused: boolean;
}

/** The looks into one cell by number of the visit, none where nobody looked in; the last visit has one. */
export type CellLooks = readonly (readonly Look[])[];

const NOT_LOOKED_AT: ReadonlySet<CellState> = new Set(['unread', 'webbed', 'damaged']);

/** The look that a mark is; null when the cell was not looked into. */
export function lookOf(mark: BroodMark): Look | null {
  if (NOT_LOOKED_AT.has(mark.state)) return null;
  const { state, instar = null, unsure = false, reused = false } = mark;
  return { state, instar: fitsInstar(mark) ? instar : null, unsure, reused };
}

/** Text that is equal for records that say the same. */
export function looksText(looks: CellLooks): string {
  const text = ({ state, instar, unsure, reused }: Look) =>
    `${state}${instar ?? ''}${unsure ? '?' : ''}${reused ? '+' : ''}`;
  return looks.map((atVisit) => atVisit.map(text).join('&')).join(' ');
}

/** A reader who is unsure errs twice as often: the off-diagonal mass of every row is doubled, at most to 1. */
function doubled(confusion: Confusion): Confusion {
  const rows = Object.entries(confusion).map(([name, row]) => {
    const right = CELL_CLASSES[name]?.recorded ?? name;
    const wrong = 1 - (row[right] ?? 0);
    const factor = wrong > 0 ? Math.min(2, 1 / wrong) : 1;
    const entries = Object.entries(row).map(([seen, p]) => [seen, seen === right ? 1 - wrong * factor : p * factor]);
    return [name, Object.fromEntries(entries)];
  });
  return Object.fromEntries(rows);
}

/** P(instar recorded | true instar): .90 right, .05 for each neighbour, renormalised at the ends. */
function instarChance(recorded: number, truth: number): number {
  const weight = (i: number) => (i < 1 || i > 5 ? 0 : ([0.9, 0.05][Math.abs(i - truth)] ?? 0));
  const total = [truth - 1, truth, truth + 1].reduce((sum, i) => sum + weight(i), 0);
  return weight(recorded) / total;
}

const LARVA = /^L(\d)$/;

/** With an instar: larvae by that instar, everything else by the class, shared by the instars of the class. */
function withInstar(byClass: Float64Array, classes: readonly string[], instar: number): Float64Array {
  return byClass.map((p, s) => {
    const larva = LARVA.exec(classes[s] ?? '');
    return larva ? instarChance(instar, Number(larva[1])) : p / 5;
  });
}

/** Where brood that is found dead was lost: in the stage it was last seen in, or in any. */
function lostLikelihood({ states }: BroodModel, lastSeen: CellState | null): Float64Array {
  const end = lastSeen === null ? null : LOST_AS[lastSeen];
  return Float64Array.from(states.keys, (key) => {
    if (!key.startsWith('RM')) return 0;
    return end === undefined || end === null || key.startsWith(`${end}#`) ? 1 : 0;
  });
}

const LOST_AS: Partial<Record<CellState, string>> = {
  egg: 'RMe',
  small: 'RMl',
  medium: 'RMl',
  large: 'RMl',
  capped: 'RMp',
};

/** The last living brood that was seen before a visit. */
function lastAlive(looks: CellLooks, visit: number): CellState | null {
  const states = looks.slice(0, visit).flatMap((atVisit) => atVisit.map(({ state }) => state));
  return states.findLast((state): state is CellState => state !== 'absent' && LOST_AS[state] !== undefined) ?? null;
}

/** P(one look | state). */
function lookLikelihood(
  model: BroodModel,
  look: Look,
  { before, floor, unsure }: { before: CellState | null; floor: number; unsure: Confusion },
): Float64Array {
  const { states, classes } = model;
  const isLost = look.state === 'dead' || look.state === 'parasitised';
  const plain = isLost
    ? lostLikelihood(model, before)
    : (likelihoodOf(look.state, look.unsure ? unsure : model.confusion, classes) ?? new Float64Array(states.count));
  const seen = look.instar === null ? plain : withInstar(plain, classes, look.instar);
  return seen.map((p, s) => {
    const isTold = !look.reused || (states.generationOf[s] ?? 0) >= 2;
    return (1 - floor) * (isTold ? p : 0) + floor / RECORDED_CLASSES.length;
  });
}

/** Looks worked out already: a comb has few kinds of them. */
const knownLooks = new WeakMap<BroodModel, Map<string, Float64Array>>();

/**
 * P(what was recorded | state) for every visit, null where nobody looked in.
 *
 * @param floor share of a record that may be anything: a slip of the hand, a neighbouring cell.
 */
export function likelihoods(model: BroodModel, looks: CellLooks, floor: number): (Float64Array | null)[] {
  const known = knownLooks.get(model) ?? new Map<string, Float64Array>();
  knownLooks.set(model, known);
  const unsure = doubled(model.confusion);
  return looks.map((atVisit, visit) =>
    atVisit.reduce<Float64Array | null>((product, look) => {
      const before = lastAlive(looks, visit);
      const key = `${floor} ${before} ${looksText([[look]])}`;
      const chance = known.get(key) ?? lookLikelihood(model, look, { before, floor, unsure });
      known.set(key, chance);
      return product ? product.map((p, s) => p * (chance[s] ?? 0)) : chance;
    }, null),
  );
}
