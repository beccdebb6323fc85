import {
  FieldError,
  type Fields,
  readList,
  readNumber,
  readObject,
  readText,
  readWhole,
} from '@/lib/brood/file-fields';
import { type CellModel, cellModel } from './cell-model';
import { type Confusion, ConfusionError } from './emission';
import { type PhaseStage, erlangStage, twoMomentStage } from './stage-fit';
import type { SpeedPiece } from './transitions';

const CONFUSION = 'confusion_true_to_observed';
const POSITIVE = { min: 1e-9, max: 1e9 };

const MOST_STATES = 5_000;
/** Faster moves than this a day would need more ticks than any question is worth. */
const FASTEST = 2_000;
const HAZARD = { min: 0, max: FASTEST };

/** Reads a list with one member a stage. */
function readPerStage<T>(
  value: unknown,
  field: string,
  { count, readItem }: { count: number; readItem: (item: unknown, field: string) => T },
): T[] {
  const list = readList(value, field, readItem);
  if (list.length !== count) throw new FieldError(field, `must have ${count} members, one a stage, has ${list.length}`);
  return list;
}

function readNames(value: unknown): string[] {
  const names = readList(value, 'model.stages', readText);
  if (names.length === 0) throw new FieldError('model.stages', 'must name at least one stage');
  names.forEach((name, i) => {
    const isTaken = names.indexOf(name) < i || name === 'absent' || name === 'empty' || name.includes('#');
    if (isTaken) throw new FieldError(`model.stages[${i}]`, `"${name}" is taken or not a stage name`);
  });
  return names;
}

/** The shape of each stage: a number of phases, or a coefficient of variation that is matched exactly. */
function readShapes(model: Fields, means: readonly number[]): Pick<PhaseStage, 'phases' | 'rate' | 'skipFirst'>[] {
  const count = means.length;
  if (model.phases === undefined && model.cv !== undefined) {
    const readItem = (item: unknown, field: string) => readNumber(item, field, { min: 0.03, max: 1 });
    return readPerStage(model.cv, 'model.cv', { count, readItem }).map((cv, i) => twoMomentStage(means[i] ?? 1, cv));
  }
  const readItem = (item: unknown, field: string) => readWhole(item, field, { min: 1, max: 2_000 });
  return readPerStage(model.phases, 'model.phases', { count, readItem }).map((k, i) => erlangStage(k, means[i] ?? 1));
}

function readHazard(item: unknown, field: string): number {
  return readNumber(item, field, HAZARD);
}

function readStages(model: Fields): PhaseStage[] {
  const names = readNames(model.stages);
  const count = names.length;
  const readMean = (item: unknown, field: string) => readNumber(item, field, POSITIVE);
  const means = readPerStage(model.mean_std_days, 'model.mean_std_days', { count, readItem: readMean });
  const shapes = readShapes(model, means);
  const given = model.removal_hazard_per_day;
  const losses = Array.isArray(given)
    ? readPerStage(given, 'model.removal_hazard_per_day', { count, readItem: readHazard })
    : names.map(() => readHazard(given, 'model.removal_hazard_per_day'));
  return shapes.map((shape, i) => ({ name: names[i] ?? '', ...shape, lossPerDay: losses[i] ?? 0 }));
}

/** Development runs at the given rate from each day on; the calendar and building clocks run evenly. */
function readPieces(value: unknown): SpeedPiece[] {
  const pieces = readList(value, 'model.rates', (item, field) => {
    const [from, rate, ...rest] = readList(item, field, (member, at) => readNumber(member, at));
    if (from === undefined || rate === undefined || rest.length > 0)
      throw new FieldError(field, 'must be [fromDay, rate]');
    return { from, speeds: [readNumber(rate, `${field}[1]`, HAZARD), 1, 1] };
  });
  if (pieces.length === 0) throw new FieldError('model.rates', 'must hold at least one [fromDay, rate]');
  pieces.forEach(({ from }, i) => {
    if (from <= (pieces[i - 1]?.from ?? -Infinity))
      throw new FieldError(`model.rates[${i}]`, 'must begin later than the one before');
  });
  return pieces;
}

function readConfusion(value: unknown): Confusion {
  const field = `model.${CONFUSION}`;
  const rows = Object.entries(readObject(value, field)).map(([name, row]) => {
    const entries = Object.entries(readObject(row, `${field}.${name}`));
    return [name, Object.fromEntries(entries.map(([seen, p]) => [seen, readNumber(p, `${field}.${name}.${seen}`)]))];
  });
  return Object.fromEntries(rows);
}

function refuseTooFast(stages: readonly PhaseStage[], pieces: readonly SpeedPiece[]): void {
  const speed = Math.max(...pieces.map(({ speeds }) => speeds[0] ?? 0));
  stages.forEach(({ rate }, i) => {
    if (rate * speed > FASTEST)
      throw new FieldError(`model.mean_std_days[${i}]`, `makes more than ${FASTEST} phases a day`);
  });
}

/** Builds the model and names the member that a refusal is about. */
function build(parts: Parameters<typeof cellModel>[0]): CellModel {
  try {
    return cellModel(parts);
  } catch (error) {
    if (error instanceof ConfusionError) throw new FieldError(`model.${CONFUSION}.${error.row}`, error.message);
    if (error instanceof RangeError) throw new FieldError('model.start_state', error.message);
    throw error;
  }
}

/**
 * Reads the `model` of a histories file: stages with phases (or `cv`) and means, hazards, generations, rates of the
 * development clock, confusion matrix. Members that only explain are ignored.
 *
 * @throws FieldError naming the member that cannot be read.
 */
export function readModel(value: unknown): CellModel {
  const model = readObject(value, 'model');
  const stages = readStages(model);
  const generations = readWhole(model.generations, 'model.generations', { min: 1, max: 20 });
  const phases = stages.reduce((sum, stage) => sum + stage.phases, 0);
  if (generations * phases > MOST_STATES) throw new FieldError('model.phases', `make more than ${MOST_STATES} states`);
  const pieces = readPieces(model.rates);
  refuseTooFast(stages, pieces);
  const hazard = (name: string) => readHazard(model[name], `model.${name}`);
  return build({
    stages,
    generations,
    rates: {
      build: hazard('hazard_not_built_to_built_per_day'),
      layFirst: hazard('hazard_built_empty_to_first_egg_per_day'),
      layNext: hazard('hazard_empty_to_next_egg_per_day'),
    },
    pieces,
    confusion: readConfusion(model[CONFUSION]),
    t0: model.t0 === undefined ? 0 : readNumber(model.t0, 'model.t0'),
    startKey: model.start_state === undefined ? 'N' : readText(model.start_state, 'model.start_state'),
  });
}
