'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { CELL_STATES, type CellState, STATE_WORDS, isCellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { PairRow } from './review-shapes';
import { EMPTY_DRAFT, type SettleDraft, settledCell, settleOptions } from './settle-choice';
import { useAct } from './use-act';

interface SettleFormProps {
  /** The reading that is settled. */
  reading: string;
  pair: PairRow;
  /** Number of the last decision the person has before them. */
  seen: number;
  onDone: () => void;
  /** The office did not take it; the form may be gone by the time the person reads why. */
  onRefused: (words: string) => void;
}

interface DraftProps {
  pair: PairRow;
  draft: SettleDraft;
  change: (part: Partial<SettleDraft>) => void;
}

function ThirdState({ pair, draft, change }: DraftProps): ReactElement {
  const others = CELL_STATES.filter((state) => state !== pair.field?.state && state !== pair.lab?.state);
  const choose = (value: string): void => change({ third: isCellState(value) ? value : null });
  return (
    <Field id={`third-${cellNumber(pair)}`} label="Third state">
      {(control) => (
        <select
          {...control}
          className="min-h-9 rounded border-2 border-ink bg-paper px-2"
          value={draft.third ?? ''}
          onChange={(event) => choose(event.target.value)}
        >
          <option value="">choose</option>
          {others.map((state: CellState) => (
            <option key={state} value={state}>
              {STATE_WORDS[state]}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

/** Whose view is taken. */
function PickChoice({ pair, draft, change }: DraftProps): ReactElement {
  return (
    <fieldset>
      <legend className="sr-only">Whose view of cell {cellNumber(pair)} is taken?</legend>
      <div className="flex flex-wrap gap-x-4">
        {settleOptions(pair).map(({ pick, words }) => (
          <label key={pick} className="flex min-h-9 items-center gap-1.5">
            <input
              type="radio"
              name={`pick-${cellNumber(pair)}`}
              checked={draft.pick === pick}
              onChange={() => change({ pick })}
              className="size-4 accent-main"
            />
            {words}
          </label>
        ))}
      </div>
    </fieldset>
  );
}

/** What the rules propose, with the rule; taking it fills the form in, and a person still settles. */
function Suggestion({ pair, change }: Omit<DraftProps, 'draft'>): ReactElement {
  const { suggestion } = pair;
  if (!suggestion) return <p className="text-sm text-quiet">No rule speaks for either: look again.</p>;
  return (
    <p className="text-sm">
      {suggestion.rule}{' '}
      <button
        type="button"
        className="font-bold text-main underline underline-offset-4"
        onClick={() => change({ pick: suggestion.pick, reason: suggestion.rule })}
      >
        Take the {suggestion.pick}
      </button>
    </p>
  );
}

/** One cell that has to be decided: whose view, and why. Each is stored by itself. */
export function SettleForm({ reading, pair, seen, onDone, onRefused }: SettleFormProps): ReactElement {
  const [draft, setDraft] = useState(EMPTY_DRAFT);
  const [missing, setMissing] = useState<string | null>(null);
  const { send, isSending } = useAct(`/api/readings/${reading}/settle`, { done: onDone, refused: onRefused });
  const change = (part: Partial<SettleDraft>): void => setDraft((before) => ({ ...before, ...part }));
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const cell = settledCell(pair, draft);
    setMissing(typeof cell === 'string' ? cell : null);
    if (typeof cell !== 'string') send({ cells: [cell], seen });
  };
  const number = cellNumber(pair);
  return (
    <form onSubmit={submit} aria-label={`Settle cell ${number}`} className="print-hidden mt-1 flex flex-col gap-2">
      <Suggestion pair={pair} change={change} />
      <PickChoice pair={pair} draft={draft} change={change} />
      {draft.pick === 'third' && <ThirdState pair={pair} draft={draft} change={change} />}
      <Field id={`reason-${number}`} label="Reason" error={missing}>
        {(control) => (
          <TextArea
            {...control}
            rows={2}
            value={draft.reason}
            onChange={(event) => change({ reason: event.target.value })}
          />
        )}
      </Field>
      <Button type="submit" disabled={isSending} className="self-start">
        {isSending ? 'Settling …' : `Settle cell ${number}`}
      </Button>
    </form>
  );
}
