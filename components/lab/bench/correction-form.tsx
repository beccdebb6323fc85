'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { cellName, type CombCellView } from '@/components/comb/comb-view';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import { type Correction, reasonTrouble } from './correction';
import { StateChoice } from './state-choice';

interface CorrectionFormProps {
  /** The picked cell as the reading has it. */
  cell: CombCellView;
  /** What is already in the list for it. */
  listed: Correction | null;
  /** The state chosen by a letter on the comb. */
  lettered: CellState | null;
  onAdd: (correction: Correction) => void;
}

/** One cell's new state and the reason for it. Give it a `key` of the cell, so that each cell starts anew. */
export function CorrectionForm({ cell, listed, lettered, onAdd }: CorrectionFormProps): ReactElement {
  const [chosen, setChosen] = useState<CellState | null>(listed?.state ?? lettered);
  const [reason, setReason] = useState(listed?.reason ?? '');
  const [trouble, setTrouble] = useState<string | null>(null);
  const add = (event: FormEvent): void => {
    event.preventDefault();
    const wrong = chosen === null ? 'Choose the new state first.' : reasonTrouble(reason);
    setTrouble(wrong);
    if (wrong === null && chosen !== null)
      onAdd({ q: cell.q, r: cell.r, was: cell.state, state: chosen, reason: reason.trim() });
  };
  return (
    <form onSubmit={add} aria-label={`Settle cell ${cellNumber(cell)}`} className="flex flex-col gap-3">
      <p>
        <span className="font-bold">Picked: </span>
        {cellName(cell)}
      </p>
      <StateChoice value={chosen} onChoose={setChosen} />
      <Field id="settle-reason" label="Reason" error={trouble}>
        {(control) => <TextArea {...control} value={reason} onChange={(event) => setReason(event.target.value)} />}
      </Field>
      <Button type="submit" className="self-start">
        {listed ? 'Change in the list' : 'Add to the list'}
      </Button>
    </form>
  );
}
