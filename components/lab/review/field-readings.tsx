'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { reasonTrouble } from '@/components/lab/bench/correction';
import { sourceWords } from '@/components/lab/lab-words';
import { Button } from '@/components/ui/button';
import { momentWords } from '@/components/ui/date-words';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import type { VisitReadingView } from './review-shapes';
import { useAct } from './use-act';

interface FieldReadingsProps {
  visit: string;
  nest: string;
  readings: readonly VisitReadingView[];
  primary: string | null;
  choice: { reason: string; actor: string; at: string } | null;
  /** May the person choose now? */
  chooses: boolean;
  zone: string;
  year: string;
}

type ListProps = Pick<FieldReadingsProps, 'readings' | 'primary' | 'nest' | 'zone' | 'year'>;

function Readings({ readings, primary, nest, zone, year }: ListProps): ReactElement {
  return (
    <ul className="list-none">
      {readings.map(({ id, observer, source, openedAt }) => (
        <li key={id} className="py-1">
          <a href={`/nests/${nest}/readings/${id}`} className="underline">
            {observer}, {sourceWords(source)}, {momentWords(openedAt, zone, year)}
          </a>
          {id === primary && readings.length > 1 && <span className="font-bold">: counts</span>}
        </li>
      ))}
    </ul>
  );
}

/** Says which of several field readings counts, and why. */
function ChooseForm({
  visit,
  readings,
  primary,
}: Pick<FieldReadingsProps, 'visit' | 'readings' | 'primary'>): ReactElement {
  const [reading, setReading] = useState(primary);
  const [reason, setReason] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const { send, isSending, trouble } = useAct(`/api/visits/${visit}/primary`, { done: () => setReason('') });
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const problem = reasonTrouble(reason);
    setWrong(problem);
    if (problem === null) send({ reading, reason: reason.trim() });
  };
  return (
    <form onSubmit={submit} aria-label="Choose the reading that counts" className="print-hidden mt-3 max-w-text">
      <fieldset>
        <legend className="font-bold">Which one counts?</legend>
        {readings.map(({ id, observer, source }) => (
          <label key={id} className="flex min-h-9 items-center gap-2">
            <input type="radio" name="primary" checked={reading === id} onChange={() => setReading(id)} />
            {observer}, {sourceWords(source)}
          </label>
        ))}
      </fieldset>
      <Field id="primary-reason" label="Reason" hint="All readings are kept." error={wrong ?? trouble}>
        {(control) => (
          <TextArea {...control} rows={2} value={reason} onChange={(event) => setReason(event.target.value)} />
        )}
      </Field>
      <Button type="submit" disabled={isSending} className="mt-2">
        This one counts
      </Button>
    </form>
  );
}

/** The field readings of a visit: one, or several of which one counts. */
export function FieldReadings(props: FieldReadingsProps): ReactElement {
  const { choice, chooses, readings, zone, year } = props;
  return (
    <>
      <Readings {...props} />
      {readings.length > 1 && !choice && (
        <Notice tone="warn" className="mt-2">
          <p>Nobody has chosen yet; until then the one handed in first counts.</p>
        </Notice>
      )}
      {choice && (
        <p className="mt-1 [overflow-wrap:anywhere]">
          Chosen by {choice.actor}, {momentWords(choice.at, zone, year)}: {choice.reason}
        </p>
      )}
      {chooses && readings.length > 1 && <ChooseForm {...props} />}
    </>
  );
}
