import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { CELL_STATES, type CellState, STATE_LETTERS, STATE_WORDS } from '@/lib/comb/states';

interface StateChoiceProps {
  value: CellState | null;
  onChoose: (state: CellState) => void;
}

/** The twelve states to choose from, each with its symbol, its word and its letter on the keyboard. */
export function StateChoice({ value, onChoose }: StateChoiceProps): ReactElement {
  return (
    <fieldset>
      <legend className="mb-1 font-bold">New state</legend>
      <div className="grid grid-cols-2 gap-1 sm:grid-cols-3">
        {CELL_STATES.map((state) => (
          <label
            key={state}
            className="flex min-h-9 items-center gap-2 rounded border-2 border-transparent px-1.5 hover:bg-wash has-checked:border-main has-checked:bg-main-wash"
          >
            <input
              type="radio"
              name="new-state"
              value={state}
              checked={value === state}
              onChange={() => onChoose(state)}
              className="size-4 accent-main"
            />
            <CellGlyph state={state} size={26} />
            <span className="grow">{STATE_WORDS[state]}</span>
            <kbd className="font-mono text-sm text-quiet" aria-hidden="true">
              {STATE_LETTERS[state]}
            </kbd>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
