import type { Result } from '@/lib/kit/result';
import { FieldError, readJsonFile, readList, readNumber, readObject, readText } from './file-fields';
import type { CellModel } from './hmm/cell-model';
import { type Observation, recordedClasses } from './hmm/emission';
import type { CellRecord } from './hmm/history-answer';
import { LAYING_STEP } from './hmm/laying';
import { readModel } from './hmm/read-model';

/** One record of a histories file. */
export interface NamedRecord extends CellRecord {
  name: string;
}

/** A histories file, read. */
export interface HistoriesFile {
  model: CellModel;
  histories: readonly NamedRecord[];
  /** Days between the times of the laying laws. */
  step: number;
  /** Times at which the laying laws are wanted themselves, or null. */
  gridTimes: readonly number[] | null;
  forecastDays: readonly number[];
}

/** The days of the forecast where a file does not say. */
export const FORECAST_DAYS: readonly number[] = [0, 1, 2, 3, 5, 7, 10, 14, 21, 28, 42, 60];

/** A visit this long after the start would need more grid times than any question is worth. */
const LONGEST_DAYS = 20_000;

function readObservation(value: unknown, field: string, classes: ReadonlySet<string>): Observation {
  if (value === null) return null;
  const readClass = (item: unknown, at: string): string => {
    const name = readText(item, at);
    if (!classes.has(name)) throw new FieldError(at, `"${name}" is not among the classes ${[...classes].join(', ')}`);
    return name;
  };
  if (!Array.isArray(value)) return readClass(value, field);
  if (value.length === 0) throw new FieldError(field, 'must name at least one class, or be null for not looked at');
  return readList(value, field, readClass);
}

function readTimes(value: unknown, field: string, start: number): number[] {
  const times = readList(value, field, (item, at) => readNumber(item, at, { min: start, max: start + LONGEST_DAYS }));
  if (times.length === 0) throw new FieldError(field, 'must hold at least one visit');
  times.forEach((time, i) => {
    if (time < (times[i - 1] ?? start)) throw new FieldError(`${field}[${i}]`, 'lies before the visit before it');
  });
  return times;
}

function readRecord(
  value: unknown,
  field: string,
  { model, classes }: { model: CellModel; classes: ReadonlySet<string> },
): NamedRecord {
  const record = readObject(value, field);
  const times = readTimes(record.times, `${field}.times`, model.start.time);
  const observations = readList(record.obs, `${field}.obs`, (item, at) => readObservation(item, at, classes));
  if (observations.length !== times.length) {
    throw new FieldError(`${field}.obs`, `must have one member a visit, ${times.length}, has ${observations.length}`);
  }
  return { name: record.name === undefined ? field : readText(record.name, `${field}.name`), times, observations };
}

/** `grid` may be a step in days, or the times at which the laws themselves are wanted. */
function readGrid(value: unknown): Pick<HistoriesFile, 'step' | 'gridTimes'> {
  if (value === undefined || value === null) return { step: LAYING_STEP, gridTimes: null };
  if (!Array.isArray(value)) return { step: readNumber(value, 'grid', { min: 0.01, max: 1_000 }), gridTimes: null };
  return { step: LAYING_STEP, gridTimes: readList(value, 'grid', (item, field) => readNumber(item, field)) };
}

function refuseGridOutside({ model, histories, gridTimes }: Omit<HistoriesFile, 'step' | 'forecastDays'>): void {
  const start = model.start.time;
  const end = Math.min(...histories.map(({ times }) => times.at(-1) ?? start));
  gridTimes?.forEach((time, i) => {
    if (time < start || time > end)
      throw new FieldError(`grid[${i}]`, `must lie between ${start} and the last visits, ${end}`);
  });
}

function readHistories(value: unknown): HistoriesFile {
  const file = readObject(value, 'file');
  const model = readModel(file.model);
  const classes = recordedClasses(model.confusion);
  const histories = readList(file.histories, 'histories', (item, field) => readRecord(item, field, { model, classes }));
  const readDay = (item: unknown, field: string) => readNumber(item, field, { min: 0, max: LONGEST_DAYS });
  const forecastDays =
    file.forecastDays === undefined ? FORECAST_DAYS : readList(file.forecastDays, 'forecastDays', readDay);
  const grid = readGrid(file.grid);
  refuseGridOutside({ model, histories, gridTimes: grid.gridTimes });
  return { model, histories, ...grid, forecastDays };
}

/**
 * Reads a histories file: `{model, histories: [{name, times, obs}], grid?, forecastDays?}`. An observation is a class,
 * a list of classes, or null for not looked at.
 *
 * @returns the model and the records, or one line naming the member that cannot be read.
 */
export function parseHistoriesFile(text: string): Result<HistoriesFile, string> {
  return readJsonFile(text, readHistories);
}
