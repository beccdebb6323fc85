import { type BroodOutlook, broodOutlook } from './brood-outlook';
import { byKey } from './brood-states';
import type { CellModel } from './cell-model';
import { type Observation, likelihoodOf } from './emission';
import { type LayingLaw, generationWeights, layingLaw, regularTimes } from './laying';
import { type Station, filterForward, posterior, valueBackward } from './stations';

/** What was recorded of one cell, in order of time. */
export interface CellRecord {
  times: readonly number[];
  observations: readonly Observation[];
}

/** Everything the model says about one record. */
export interface HistoryAnswer {
  /** −∞ when the model cannot produce the record; everything else is then null. */
  logLik: number;
  filtered: Record<string, number>[] | null;
  smoothed: Record<string, number>[] | null;
  laying: LayingLaw | null;
  occupiedAtLast: number | null;
  generationWeights: number[] | null;
  outlook: BroodOutlook | null;
}

/** The visits of a record as stations of the chain. */
export function visitStations({ states, confusion }: CellModel, { times, observations }: CellRecord): Station[] {
  return times.map((time, i) => ({
    time,
    likelihood: likelihoodOf(observations[i] ?? null, confusion, states.classes),
  }));
}

const IMPOSSIBLE: HistoryAnswer = {
  logLik: -Infinity,
  filtered: null,
  smoothed: null,
  laying: null,
  occupiedAtLast: null,
  generationWeights: null,
  outlook: null,
};

/**
 * Works a record out: forward and backward pass over the visits, laying law, present brood and what becomes of it.
 *
 * @param record at least one visit, none before the model's start.
 */
export function historyAnswer(
  model: CellModel,
  record: CellRecord,
  { step, daysAfter }: { step: number; daysAfter: readonly number[] },
): HistoryAnswer {
  const visits = visitStations(model, record);
  const { filtered, logLik } = filterForward(model.chain, model.start, visits);
  const last = filtered.at(-1);
  if (!last || logLik === -Infinity) return IMPOSSIBLE;
  const values = valueBackward(model.chain, new Float64Array(model.states.count).fill(1), visits);
  const occupied = Array.from({ length: model.states.generations }, (_, g) => model.states.occupied(g + 1));
  return {
    logLik,
    filtered: filtered.map((mass) => byKey(model.states, mass)),
    smoothed: posterior(filtered, values).map((mass) => byKey(model.states, mass)),
    laying: layingLaw(model, visits, regularTimes(visits, model.start.time, step)),
    occupiedAtLast: last.reduce((sum, p, s) => sum + p * occupied.reduce((any, set) => any + (set[s] ?? 0), 0), 0),
    generationWeights: generationWeights(model, last),
    outlook: broodOutlook(model, { time: record.times.at(-1) ?? 0, mass: last }, daysAfter),
  };
}
