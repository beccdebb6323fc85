import 'server-only';
import { censusOf } from './census';
import { idKey } from './id-key';
import type { ReadingRow } from './reading-rows';

/** Which two readings of one visit are compared. */
export type Comparison = 'field-field' | 'field-lab' | 'other-reader' | 'same-reader';

/** Two submitted readings of one comb at one visit. */
export interface ReadingPair {
  comparison: Comparison;
  first: ReadingRow;
  second: ReadingRow;
}

/** The field reading that speaks for the visit: the one that was settled or locked, else the one shown for it. */
function primaryField(readings: readonly ReadingRow[], fields: readonly ReadingRow[]): ReadingRow | null {
  const based = new Set(readings.flatMap(({ based_on }) => (based_on ? [idKey(based_on)] : [])));
  return fields.find(({ id }) => based.has(idKey(id))) ?? censusOf(fields);
}

function rereading(blind: ReadingRow, later: ReadingRow): ReadingPair {
  const isSame = later.opened_by.equals(blind.opened_by);
  return { comparison: isSame ? 'same-reader' : 'other-reader', first: blind, second: later };
}

/**
 * The comparisons one visit gives: its field reading with every further field reading and with the first lab reading,
 * and that lab reading with every later one, by another reader or by the same. Readings not yet submitted take no part.
 *
 * @param readings all of one visit, in the order they were opened.
 */
export function pairsOfVisit(readings: readonly ReadingRow[]): ReadingPair[] {
  const submitted = readings.filter(({ submitted_at }) => submitted_at !== null);
  const fields = submitted.filter(({ kind }) => kind === 'field');
  const [blind, ...again] = submitted.filter(({ kind }) => kind === 'second');
  const field = primaryField(readings, fields);
  const pairs: ReadingPair[] = [];
  if (field) {
    for (const other of fields) {
      if (other !== field) pairs.push({ comparison: 'field-field', first: field, second: other });
    }
    if (blind) pairs.push({ comparison: 'field-lab', first: field, second: blind });
  }
  return blind ? [...pairs, ...again.map((later) => rereading(blind, later))] : pairs;
}
