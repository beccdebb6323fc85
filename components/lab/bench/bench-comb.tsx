import type { KeyboardEvent, ReactElement } from 'react';
import { CombDiagram } from '@/components/comb/comb-diagram';
import { CombKey } from '@/components/comb/comb-key';
import type { CombCellView } from '@/components/comb/comb-view';
import { cellKey } from '@/lib/comb/axial';
import { CELL_STATES, type CellState, STATE_LETTERS } from '@/lib/comb/states';
import type { Correction } from './correction';
import type { Desk } from './use-desk';

interface BenchCombProps extends Pick<Desk, 'draft' | 'corrections' | 'pick' | 'choose'> {
  label: string;
  cells: readonly CombCellView[];
  cellSize: number;
}

/** The cells with the decisions of the list drawn in, so that the comb shows what will be. */
function withList(cells: readonly CombCellView[], corrections: readonly Correction[]): CombCellView[] {
  const byKey = new Map(corrections.map((correction) => [cellKey(correction), correction]));
  return cells.map((cell) => {
    const correction = byKey.get(cellKey(cell));
    return correction ? { ...cell, state: correction.state, changed: true } : cell;
  });
}

/** The state a key stands for, by the letters of the paper sheet. */
function typedState({ key, ctrlKey, metaKey, altKey }: KeyboardEvent): CellState | null {
  if (ctrlKey || metaKey || altKey) return null;
  return CELL_STATES.find((state) => STATE_LETTERS[state] === key.toLowerCase()) ?? null;
}

/** The comb on the bench: a press or an arrow key picks a cell, a letter chooses its new state. */
export function BenchComb({ label, cells, cellSize, draft, corrections, pick, choose }: BenchCombProps): ReactElement {
  const type = (event: KeyboardEvent): void => {
    const state = typedState(event);
    if (state) choose(state);
  };
  return (
    <div>
      <div className="overflow-x-auto print:overflow-visible" onKeyDown={type}>
        <CombDiagram
          cells={withList(cells, corrections)}
          label={label}
          cellSize={cellSize}
          current={draft?.cell ?? null}
          onCellPress={pick}
          onCellReach={pick}
        />
      </div>
      <CombKey className="mt-3" />
    </div>
  );
}
