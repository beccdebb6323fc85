import { chainOf } from '@/lib/brood/hmm/chain';
import { quadrature } from '@/lib/brood/hmm/legendre';
import { transitions } from '@/lib/brood/hmm/transitions';

/** A stage of so many equal phases and days. */
export interface Shape {
  phases: number;
  meanDays: number;
}

/** Stages one after another as one chain of the core; the state after the last phase is "out". */
function stageRow(shapes: readonly Shape[]) {
  const rates = shapes.flatMap(({ phases, meanDays }) => Array<number>(phases).fill(phases / meanDays));
  const moves = rates.map((rate, i) => ({ source: i, target: i + 1, clock: 0, rate }));
  const chain = chainOf(transitions(rates.length + 1, 1, moves), [{ from: 0, speeds: [1] }]);
  return { rates, chain };
}

/** Masses by phase (and out) after so many days, starting at the first phase or as given. */
export function massesAt(shapes: readonly Shape[], days: number, start?: Float64Array): Float64Array {
  const { rates, chain } = stageRow(shapes);
  const first = new Float64Array(rates.length + 1);
  first[0] = 1;
  return chain.forward(start ?? first, { from: 0, to: days });
}

/** Phases `from` … `to − 1` as a sighting finds them when the egg may have been laid at any time: by time spent. */
function sighted(shapes: readonly Shape[], from: number, to: number): Float64Array {
  const { rates } = stageRow(shapes);
  const days = rates.map((rate, i) => (i >= from && i < to ? 1 / rate : 0));
  const total = days.reduce((sum, x) => sum + x, 0);
  return Float64Array.from([...days.map((x) => x / total), 0]);
}

/** P(phase `to` is reached within x days of a sighting in phases `from` … `to − 1`). */
export function reachedBy(shapes: readonly Shape[], [from, to]: readonly [number, number], x: number): number {
  return massesAt(shapes, x, sighted(shapes, from, to))
    .subarray(to)
    .reduce((sum, p) => sum + p, 0);
}

/** P(the row was entered at most x days before a sighting in phases `from` … `to − 1`): the row read backwards. */
export function enteredWithin(shapes: readonly Shape[], [from, to]: readonly [number, number], x: number): number {
  const { rates } = stageRow(shapes);
  const size = rates.length;
  const backwards = [...rates].reverse().map((rate) => ({ phases: 1, meanDays: 1 / rate }));
  const seen = sighted(shapes, from, to).subarray(0, size);
  return massesAt(backwards, x, Float64Array.from([...[...seen].reverse(), 0]))[size] ?? NaN;
}

/** ∫ (1 − F) over the days of a law that begins at 0. */
export function meanOf(cdf: (x: number) => number, longest: number): number {
  return quadrature({ from: 0, to: longest }, longest / 160).reduce(
    (sum, { at, weight }) => sum + weight * (1 - cdf(at)),
    0,
  );
}
