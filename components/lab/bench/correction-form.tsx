import type { FormEvent, ReactElement } from 'react';
import { cellName } from '@/components/comb/comb-view';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { cellNumber } from '@/lib/comb/walk';
import { StateChoice } from './state-choice';
import type { Desk, Draft } from './use-desk';

interface CorrectionFormProps extends Pick<Desk, 'choose' | 'explain' | 'add'> {
  draft: Draft;
  /** Is the cell in the list already? */
  isListed: boolean;
}

/** One cell's new state and the reason for it. */
export function CorrectionForm({ draft, isListed, choose, explain, add }: CorrectionFormProps): ReactElement {
  const { cell, state, reason, trouble } = draft;
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    add();
  };
  return (
    <form onSubmit={submit} aria-label={`Settle cell ${cellNumber(cell)}`} className="flex flex-col gap-3">
      <p>
        <span className="font-bold">Picked: </span>
        {cellName(cell)}
      </p>
      <StateChoice value={state} onChoose={choose} />
      <Field id="settle-reason" label="Reason" error={trouble}>
        {(control) => <TextArea {...control} value={reason} onChange={(event) => explain(event.target.value)} />}
      </Field>
      <Button type="submit" className="self-start">
        {isListed ? 'Change in the list' : 'Add to the list'}
      </Button>
    </form>
  );
}
