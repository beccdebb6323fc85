import type { ReactElement } from 'react';
import { AS_EXPECTED_KEY, NO_CELL_KEY } from '@/components/field/recorder/key-map';
import { CELL_STATES, STATE_LETTERS, STATE_WORDS } from '@/lib/comb/states';

const OTHER_KEYS = [
  ["'", 'nectar, before the state'],
  ['?', 'unsure, before the state'],
  [NO_CELL_KEY, 'no cell here'],
  [AS_EXPECTED_KEY, 'as expected'],
  ['← →', 'the neighbours in the row'],
  ['↑ ↓', 'the neighbours above and below, straight up and down the comb'],
  ['Shift ↑ ↓', 'the other two neighbours above and below'],
  ['Page ↑ ↓', 'one cell back and forward in the walk'],
  ['Home End', 'first and last cell'],
  ['Backspace', 'undo'],
] as const;

const KEYS: readonly (readonly [key: string, act: string])[] = [
  ...CELL_STATES.map((state) => [STATE_LETTERS[state], STATE_WORDS[state]] as const),
  ...OTHER_KEYS,
];

/** The keyboard of the recorder: the letters of the paper sheet, and a few more. */
export function KeyList(): ReactElement {
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
      {KEYS.map(([key, act]) => (
        <div key={key} className="contents">
          <dt className="font-mono font-bold whitespace-nowrap">{key}</dt>
          <dd>{act}</dd>
        </div>
      ))}
    </dl>
  );
}
