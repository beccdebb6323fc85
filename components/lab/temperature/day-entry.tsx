'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { readDayEntry } from './read-day-entry';
import { useKeep } from '@/components/lab/use-keep';

interface DayEntryProps {
  nest: string;
}

const BLANK = { date: '', min: '', max: '' };

const FIELDS = [
  { name: 'date', label: 'Day', type: 'date', hint: undefined },
  { name: 'min', label: 'Lowest', type: 'text', hint: '°C' },
  { name: 'max', label: 'Highest', type: 'text', hint: '°C' },
] as const;

/** Notes lowest and highest of one day by hand. */
export function DayEntry({ nest }: DayEntryProps): ReactElement {
  const [entry, setEntry] = useState(BLANK);
  const [wrong, setWrong] = useState<string | null>(null);
  const { send, isSending, trouble } = useKeep(() => setEntry(BLANK));
  const keep = (event: FormEvent): void => {
    event.preventDefault();
    const read = readDayEntry(entry);
    setWrong(read.ok ? null : read.error);
    if (read.ok) send({ method: 'POST', path: `/api/nests/${nest}/temperature`, body: { days: [read.value] } });
  };
  const words = wrong ?? trouble;
  return (
    <form onSubmit={keep} noValidate className="flex flex-col gap-3">
      <div className="flex flex-wrap items-end gap-3">
        {FIELDS.map(({ name, label, type, hint }) => (
          <Field key={name} id={`day-${name}`} label={label} hint={hint} className={name === 'date' ? 'w-44' : 'w-24'}>
            {(control) => (
              <Input
                {...control}
                type={type}
                inputMode={type === 'text' ? 'decimal' : undefined}
                value={entry[name]}
                onChange={(event) => setEntry({ ...entry, [name]: event.target.value })}
              />
            )}
          </Field>
        ))}
        <Button type="submit" disabled={isSending}>
          {isSending ? 'Keeping …' : 'Keep the day'}
        </Button>
      </div>
      {words && (
        <Notice tone="stop" live="assertive">
          <p>{words}</p>
        </Notice>
      )}
    </form>
  );
}
