import { isStepKey, type Step } from '@/components/comb/comb-steps';
import { commandOfKey, type KeyPress } from '@/components/field/recorder/key-map';
import type { CellState } from '@/lib/comb/states';
import type { Toggles } from '@/lib/offline/recorder-view';

/** One of the six neighbours, by its place in `DIRECTIONS`: 0 upper left, clockwise. */
export type Neighbour = 0 | 1 | 2 | 3 | 4 | 5;

/** What a key of the bench asks for. */
export type BenchCommand =
  | { do: 'mark'; state: CellState }
  | { do: 'toggle'; mark: keyof Toggles }
  | { do: 'instar'; instar: number }
  | { do: 'undo' }
  | { do: 'redo' }
  | { do: 'no-cell' }
  | { do: 'finish' }
  | { do: 'step'; step: Step }
  | { do: 'neighbour'; way: Neighbour };

/** The two pairs of keys for the slanting steps, by what they print and by where they lie on the keyboard. */
const SLANTED = new Map<string, Neighbour>([
  ['[', 0],
  [']', 1],
  ['.', 3],
  [',', 4],
  ['BracketLeft', 0],
  ['BracketRight', 1],
]);

const PLAIN = new Map<string, BenchCommand>([
  ['r', { do: 'toggle', mark: 'reused' }],
  ['k', { do: 'toggle', mark: 'scrap' }],
  ['f', { do: 'finish' }],
]);

const INSTAR = /^[1-5]$/;

/** The letters of the bench beyond those of the paper sheet. */
export const BENCH_LETTERS = { reused: 'r', scrap: 'k', finish: 'f' } as const;

function isRedo({ key, shiftKey, ctrlKey, metaKey }: KeyPress): boolean {
  if (!ctrlKey && !metaKey) return false;
  const letter = key.toLowerCase();
  return letter === 'y' || (letter === 'z' && shiftKey);
}

/** A key with where it lies on the keyboard, which does not change with its language. */
export type BenchKeyPress = KeyPress & { code: string };

/**
 * Translates a key press at the bench: the letters of the paper sheet, digits for the instar, the marks, six directions,
 * undo and redo.
 *
 * @returns null for every key that is not ours, so that the browser keeps it.
 */
export function benchCommand(press: BenchKeyPress): BenchCommand | null {
  if (isRedo(press)) return { do: 'redo' };
  // A layout that prints brackets with AltGr reports Ctrl and Alt with them.
  const way = SLANTED.get(press.key) ?? (press.ctrlKey || press.altKey ? undefined : SLANTED.get(press.code));
  if (way !== undefined) return { do: 'neighbour', way };
  const known = commandOfKey(press);
  // A blind reader is shown no expectation, so there is none to confirm.
  if (known && known.do !== 'expected') return known;
  if (press.ctrlKey || press.metaKey || press.altKey || isStepKey(press.key)) return null;
  if (INSTAR.test(press.key)) return { do: 'instar', instar: Number(press.key) };
  return PLAIN.get(press.key.toLowerCase()) ?? null;
}
