import type { HistoriesFile, NamedRecord } from './histories-file';
import { type HistoryAnswer, historyAnswer, visitStations } from './hmm/history-answer';
import { type LayingLaw, layingLaw, quantileTime } from './hmm/laying';

const QUANTILES = [0.025, 0.1, 0.25, 0.5, 0.75, 0.9, 0.975];

/** Times of laying by probability, `{"0.5": 12.3, …}`. */
type Quantiles = Record<string, number>;

/** One record of the batch door's answer. */
interface HistoryRow {
  name: string;
  /** Null when the model cannot produce the record; so is everything else then. */
  loglik: number | null;
  filtered: Record<string, number>[] | null;
  smoothed: Record<string, number>[] | null;
  /** Where the first egg is not laid with this probability by the last visit, the time of that visit. */
  laid_gen1_quantiles: Quantiles | null;
  laid_current_quantiles: Quantiles | null;
  p_occupied_at_last_census: number | null;
  generation_weights_given_occupied: number[] | null;
  forecast: { days_after_last_census: number[]; capped: number[]; emerged: number[]; removed: number[] } | null;
  /** Only when the file asks for times of its own. */
  grid?: number[];
  laid_gen1?: number[];
  laid_current?: number[] | null;
}

function quantiles({ times }: LayingLaw, cdf: Float64Array | null): Quantiles | null {
  return cdf && Object.fromEntries(QUANTILES.map((p) => [String(p), quantileTime(times, cdf, p)]));
}

function forecastRow(outlook: HistoryAnswer['outlook']): HistoryRow['forecast'] {
  if (!outlook) return null;
  const { daysAfter, capped, emerged, removed } = outlook;
  return { days_after_last_census: [...daysAfter], capped, emerged, removed };
}

/** The laying laws at the times the file asks for. */
function gridMembers({ model, gridTimes }: HistoriesFile, record: NamedRecord): Partial<HistoryRow> {
  if (!gridTimes) return {};
  const law = layingLaw(model, visitStations(model, record), gridTimes);
  const at = (cdf: Float64Array) => gridTimes.map((time) => cdf[law.times.indexOf(time)] ?? NaN);
  return { grid: [...gridTimes], laid_gen1: at(law.first), laid_current: law.current && at(law.current) };
}

function historyRow(file: HistoriesFile, record: NamedRecord): HistoryRow {
  const answer = historyAnswer(file.model, record, { step: file.step, daysAfter: file.forecastDays });
  const { laying } = answer;
  return {
    name: record.name,
    loglik: answer.logLik === -Infinity ? null : answer.logLik,
    filtered: answer.filtered,
    smoothed: answer.smoothed,
    laid_gen1_quantiles: laying && quantiles(laying, laying.first),
    laid_current_quantiles: laying && quantiles(laying, laying.current),
    p_occupied_at_last_census: answer.occupiedAtLast,
    generation_weights_given_occupied: answer.generationWeights,
    forecast: forecastRow(answer.outlook),
    ...(laying ? gridMembers(file, record) : {}),
  };
}

/** Answers every record of a histories file; equal records are worked out once. */
export function answerHistories(file: HistoriesFile): { histories: HistoryRow[] } {
  const known = new Map<string, HistoryRow>();
  const histories = file.histories.map((record) => {
    const key = JSON.stringify([record.times, record.observations]);
    const row = known.get(key) ?? historyRow(file, record);
    known.set(key, row);
    return { ...row, name: record.name };
  });
  return { histories };
}
