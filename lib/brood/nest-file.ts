import { cellKey, isAddress, MAX_ADDRESS } from '@/lib/comb/axial';
import { CELL_STATES, isCellState } from '@/lib/comb/states';
import { isTimeZone } from '@/lib/kit/local-date';
import type { Result } from '@/lib/kit/result';
import { FieldError, readFlag, readJsonFile, readList, readObject, readText, readWhole } from './file-fields';
import type { BroodInput, BroodMark, BroodReading } from './input';
import { readInstant } from './read-instant';
import { readSettings } from './read-settings';
import { readPlace, readTemperature } from './temperature-file';

function readMark(value: unknown, field: string): BroodMark {
  const mark = readObject(value, field);
  const q = readWhole(mark.q, `${field}.q`);
  const r = readWhole(mark.r, `${field}.r`);
  if (!isAddress(q, r))
    throw new FieldError(field, `cell ${q},${r} lies further than ${MAX_ADDRESS} from the pedicel cell`);
  if (!isCellState(mark.state)) throw new FieldError(`${field}.state`, `must be one of ${CELL_STATES.join(', ')}`);
  const instar = mark.instar ?? null;
  return {
    q,
    r,
    state: mark.state,
    instar: instar === null ? null : readWhole(instar, `${field}.instar`, { min: 1, max: 5 }),
    nectar: readFlag(mark.nectar, `${field}.nectar`),
    unsure: readFlag(mark.unsure, `${field}.unsure`),
    reused: readFlag(mark.reused, `${field}.reused`),
  };
}

function refuseRepeats(marks: readonly BroodMark[], field: string): void {
  const seen = new Set<string>();
  marks.forEach((mark, i) => {
    const key = cellKey(mark);
    if (seen.has(key)) throw new FieldError(`${field}[${i}]`, `cell ${key} is marked a second time in this reading`);
    seen.add(key);
  });
}

function readReading(value: unknown, field: string, zone: string): BroodReading {
  const reading = readObject(value, field);
  const marks = readList(reading.marks, `${field}.marks`, readMark);
  refuseRepeats(marks, `${field}.marks`);
  return {
    id: reading.id === undefined ? field : readText(reading.id, `${field}.id`),
    at: readInstant(reading.at, `${field}.at`, zone),
    marks,
  };
}

function readZone(value: unknown): string {
  if (value === undefined) return 'UTC';
  const zone = readText(value, 'zone');
  if (!isTimeZone(zone)) throw new FieldError('zone', `"${zone}" is not a time zone known here`);
  return zone;
}

function readAsOf(value: unknown, readings: readonly BroodReading[], zone: string): number {
  if (value !== undefined) return readInstant(value, 'asOf', zone);
  if (readings.length === 0) throw new FieldError('asOf', 'is needed when there is no reading');
  return Math.max(...readings.map(({ at }) => at));
}

function readNest(value: unknown): BroodInput {
  const file = readObject(value, 'file');
  const zone = readZone(file.zone);
  const readings = readList(file.readings, 'readings', (item, field) => readReading(item, field, zone));
  return {
    nest: file.nest === undefined ? 'nest' : readText(file.nest, 'nest'),
    zone,
    asOf: readAsOf(file.asOf, readings, zone),
    readings,
    taxon: file.taxon === undefined || file.taxon === null ? null : readText(file.taxon, 'taxon'),
    settings: file.settings === undefined ? undefined : readSettings(file.settings, 'settings'),
    temperature: readTemperature(file.temperature, zone),
    place: readPlace(file.place),
  };
}

/**
 * Reads a nest file: `{readings: [{at, marks: [{q, r, state, …}]}], taxon?, zone?, asOf?, nest?, temperature?,
 * place?, settings?}`. The zone is UTC and `asOf` the time of the last reading unless given; other members are ignored.
 *
 * @returns the input of `estimateNest`, or one line naming the member that cannot be read.
 */
export function parseNestFile(text: string): Result<BroodInput, string> {
  return readJsonFile(text, readNest);
}
