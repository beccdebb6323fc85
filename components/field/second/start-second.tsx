'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { readCount } from '@/components/field/parts/read-count';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { useCommands } from '@/lib/offline/hooks/use-commands';
import type { VisitRef } from './visit-ref';

/** What a second reader may read from: both are stored as sources of a reading. */
const SOURCES = [
  { source: 'photo', title: 'Photos or a print' },
  { source: 'phone', title: 'The comb itself' },
] as const;

type Source = (typeof SOURCES)[number]['source'];

interface StartSecondProps {
  at: VisitRef;
  /** Called with the new reading and how many cells were counted. */
  onStarted: (reading: string, counted: number | null) => void;
}

/** Keeps the new reading; `failed` turns true when this browser could not. */
function useStart({ at, onStarted }: StartSecondProps) {
  const commands = useCommands();
  const [state, setState] = useState<'ready' | 'saving' | 'failed'>('ready');
  const start = async (source: Source, counted: number | null): Promise<void> => {
    if (!commands || state === 'saving') return;
    setState('saving');
    try {
      onStarted(await commands.openReading({ nest: at.nest, visit: at.visit, kind: 'second', source }), counted);
    } catch {
      setState('failed');
    }
  };
  return { state, start };
}

/** Asks what is read from and how many cells there are, before a blind reading begins. */
export function StartSecond(props: StartSecondProps): ReactElement {
  const { state, start } = useStart(props);
  const [source, setSource] = useState<Source>('photo');
  const [counted, setCounted] = useState<number | null>(null);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    void start(source, counted);
  };
  return (
    <form onSubmit={submit} className="flex max-w-text flex-col gap-5">
      <fieldset>
        <legend className="font-bold">What do you read from?</legend>
        {SOURCES.map(({ source: value, title }) => (
          <label key={value} className="flex min-h-11 items-center gap-2">
            <input type="radio" name="source" checked={source === value} onChange={() => setSource(value)} />
            {title}
          </label>
        ))}
      </fieldset>
      <Field
        id="second-counted"
        label="How many cells do you count?"
        hint="Can stay blank. The walk ends at this number."
      >
        {(control) => (
          <Input
            {...control}
            inputMode="numeric"
            autoComplete="off"
            value={counted ?? ''}
            onChange={(event) => setCounted(readCount(event.target.value))}
            className="max-w-32"
          />
        )}
      </Field>
      {state === 'failed' && (
        <Notice tone="stop" live="assertive">
          <p>This browser could not keep the new reading. Free some space, then try again.</p>
        </Notice>
      )}
      <Button type="submit" tone="main" className="min-h-11 self-start">
        {state === 'saving' ? 'Saving …' : 'Begin the blind reading'}
      </Button>
    </form>
  );
}
