'use client';

import { type ChangeEvent, type ReactElement, useId, useState } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { FieldLink } from '@/components/field/parts/field-button';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { type BringInResult, useBringIn } from '@/lib/offline/hooks/use-bring-in';
import type { FileFault } from '@/lib/offline/unsent-file';

type State = { kind: 'ready' | 'reading' | 'failed' } | BringInResult;

const FAULT_WORDS: Readonly<Record<FileFault, { title: string; todo: string }>> = {
  other: {
    title: 'This is not a copy of unsent work',
    todo: 'Choose the file whose name begins with undereave-unsent.',
  },
  newer: { title: 'A newer app wrote this file', todo: 'Open this app once where there is signal, then try again.' },
  changed: {
    title: 'This file is not as it was written',
    todo: 'It was cut off or changed on the way, so nothing was taken from it. Fetch it again, or make a new copy.',
  },
};

function DoneWords({ added, known }: { added: number; known: number }): ReactElement {
  const title = added === 0 ? 'Everything in it was here already' : `${countWords(added, 'item')} taken in`;
  return (
    <Notice live="polite" title={title}>
      <p>
        {known > 0 && added > 0 && `${countWords(known, 'item')} of the file were here already. `}
        They go to the office from here by themselves. If the other phone sends them too, each still counts once.
      </p>
    </Notice>
  );
}

/** What became of the file, in words. */
function Outcome({ state }: { state: State }): ReactElement | null {
  switch (state.kind) {
    case 'done':
      return <DoneWords added={state.added} known={state.known} />;
    case 'not-yours':
      return (
        <Notice tone="stop" live="assertive" title={`This is the work of ${state.displayName}`}>
          <p>
            Only {state.displayName} of {state.teamName} can send it: the office writes down who recorded what. Nothing
            was taken in. Let them sign in here and open the file.
          </p>
        </Notice>
      );
    case 'fault':
      return (
        <Notice tone="stop" live="assertive" title={FAULT_WORDS[state.fault].title}>
          <p>{FAULT_WORDS[state.fault].todo}</p>
        </Notice>
      );
    case 'failed':
      return (
        <Notice tone="stop" live="assertive" title="Not taken in">
          <p>The file could not be read or kept here. Nothing is lost: the file is as it was. Try again.</p>
        </Notice>
      );
    case 'reading':
      return <p role="status">Reading the file …</p>;
    case 'ready':
      return null;
  }
}

function useFile() {
  const bringIn = useBringIn();
  const [state, setState] = useState<State>({ kind: 'ready' });
  const choose = async (event: ChangeEvent<HTMLInputElement>): Promise<void> => {
    const input = event.target;
    const file = input.files?.[0];
    if (!file || !bringIn) return;
    setState({ kind: 'reading' });
    try {
      setState(await bringIn(await file.text()));
    } catch {
      setState({ kind: 'failed' });
    }
    // The same file may be chosen again after a failure.
    input.value = '';
  };
  return { state, choose };
}

/** Takes in the copy of unsent work that another phone made. Works without signal, on a phone or at a desk. */
export function BringInScreen(): ReactElement {
  const { state, choose } = useFile();
  const id = useId();
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'unsent' }), to: 'unsent work' }} help="bring-in">
      <Screen title="Take in a copy">
        <p>
          A phone that cannot send, or is handed on, makes one file of everything unsent. Open your own file here; doing
          so twice changes nothing.
        </p>
        <div className="flex flex-col gap-2">
          <label htmlFor={id} className="font-bold">
            File of unsent work
          </label>
          <input
            id={id}
            type="file"
            accept="application/json,.json"
            onChange={(event) => void choose(event)}
            className="min-h-field w-full rounded-xl border-3 border-ink bg-paper p-2 file:mr-4 file:min-h-11 file:rounded file:border-2 file:border-ink file:bg-paper file:px-4 file:font-bold file:text-ink"
          />
        </div>
        <Outcome state={state} />
        <FieldLink href={fieldHref({ kind: 'unsent' })}>To unsent work</FieldLink>
      </Screen>
    </FieldFrame>
  );
}
