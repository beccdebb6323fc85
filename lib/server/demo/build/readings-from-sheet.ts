import 'server-only';
import type { CellState } from '@/lib/comb/states';
import type { CellStory } from '@/lib/server/demo/story/reading-story';

/** The letters of a typed sheet. */
const LETTERS: Readonly<Record<string, CellState>> = {
  c: 'capped',
  p: 'parasitised',
  l: 'large',
  m: 'medium',
  s: 'small',
  e: 'egg',
  '-': 'empty',
};

/** The three readings of one comb, cell by cell in the order of the sheet. */
export interface SheetReadings {
  field: CellStory[];
  blind: CellStory[];
  final: CellStory[];
}

function stateOf(letter: string | undefined): CellState {
  const state = letter === undefined ? undefined : LETTERS[letter];
  if (!state) throw new RangeError(`Not a letter of the sheet: ${letter}`);
  return state;
}

/**
 * Reads a sheet of entries `cell,q,r,field,blind,final` separated by white space.
 *
 * @throws RangeError for a letter that is not on the sheet.
 */
export function readingsFromSheet(sheet: string): SheetReadings {
  const readings: SheetReadings = { field: [], blind: [], final: [] };
  for (const entry of sheet.trim().split(/\s+/)) {
    const [, q, r, field, blind, final] = entry.split(',');
    const at = { q: Number(q), r: Number(r) };
    readings.field.push({ ...at, state: stateOf(field) });
    readings.blind.push({ ...at, state: stateOf(blind) });
    readings.final.push({ ...at, state: stateOf(final) });
  }
  return readings;
}
