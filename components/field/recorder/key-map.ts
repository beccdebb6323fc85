import { isStepKey, type Step } from '@/components/comb/comb-steps';
import { CELL_STATES, type CellState, STATE_LETTERS } from '@/lib/comb/states';

/** What a key press asks the recorder to do. */
export type RecorderCommand =
  | { do: 'mark'; state: CellState }
  | { do: 'toggle'; mark: 'nectar' | 'unsure' }
  | { do: 'undo' }
  | { do: 'no-cell' }
  | { do: 'expected' }
  | { do: 'step'; step: Step };

/** The parts of a keyboard event that matter. */
export interface KeyPress {
  key: string;
  shiftKey: boolean;
  ctrlKey: boolean;
  metaKey: boolean;
  altKey: boolean;
}

/** The key that says a rim place holds no cell; no letter of the paper sheet uses it. */
export const NO_CELL_KEY = 'n';

/** The key that says a cell holds what was expected. */
export const AS_EXPECTED_KEY = '=';

const STATE_OF_LETTER = new Map<string, CellState>([
  ...CELL_STATES.map((state) => [STATE_LETTERS[state], state] as const),
  // The paper sheet prints an en dash; many keyboards make one of two hyphens.
  ['–', 'empty'],
]);

const FIXED = new Map<string, RecorderCommand>([
  ["'", { do: 'toggle', mark: 'nectar' }],
  ['’', { do: 'toggle', mark: 'nectar' }],
  ['?', { do: 'toggle', mark: 'unsure' }],
  ['Backspace', { do: 'undo' }],
  [NO_CELL_KEY, { do: 'no-cell' }],
  [AS_EXPECTED_KEY, { do: 'expected' }],
]);

/**
 * Translates a key press: the letters of the paper sheet set the state, `'` and `?` the marks, arrows move to the
 * neighbours (Shift takes the other of the two above or below), Backspace or Ctrl+Z takes the last act back.
 *
 * @returns null for every key that is not ours, so that the browser keeps it.
 */
export function commandOfKey({ key, shiftKey, ctrlKey, metaKey, altKey }: KeyPress): RecorderCommand | null {
  if (altKey) return null;
  if (ctrlKey || metaKey) return key.toLowerCase() === 'z' && !shiftKey ? { do: 'undo' } : null;
  if (isStepKey(key)) return { do: 'step', step: { key, shift: shiftKey } };
  const letter = key.length === 1 ? key.toLowerCase() : key;
  const state = STATE_OF_LETTER.get(letter);
  return state ? { do: 'mark', state } : (FIXED.get(letter) ?? null);
}
