'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { ComeDownCard } from '@/components/field/cautions/near-nest-card';
import { Choices } from '@/components/field/parts/choices';
import { CountField } from '@/components/field/parts/count-field';
import { NotSavedNotice } from '@/components/field/parts/not-saved-notice';
import { usePerson } from '@/components/field/parts/person-context';
import { Sheet } from '@/components/field/parts/sheet';
import { countedQuery } from '@/components/field/recorder/counted-query';
import { fieldHref } from '@/components/field/routing/field-route';
import { goTo } from '@/components/field/routing/use-field-path';
import { SOURCES } from '@/components/field/words/reading-words';
import { useCommands } from '@/lib/offline/hooks/use-commands';
import type { ReadingSummary, VisitView } from '@/lib/offline/nest-view';

const SOURCE_CHOICES = SOURCES.map(({ source, title }) => ({ value: source, title }));

interface StartReadingProps {
  visit: VisitView;
  open: boolean;
  onClose: () => void;
}

/** Keeps the new reading and opens the recorder on it. People of the lab make second readings. */
function useNewReading(visit: VisitView) {
  const commands = useCommands();
  const { role } = usePerson();
  const [state, setState] = useState<'ready' | 'saving' | 'failed'>('ready');
  const start = async (source: ReadingSummary['source'], counted: number | null): Promise<void> => {
    if (!commands || state === 'saving') return;
    setState('saving');
    const kind = role === 'reviewer' || role === 'biologist' ? 'second' : 'field';
    try {
      const id = await commands.openReading({ nest: visit.nest, visit: visit.id, kind, source });
      goTo(fieldHref({ kind: 'reading', id }) + countedQuery(counted));
    } catch {
      setState('failed');
    }
  };
  return { state, start };
}

/** Asks what is read and how many cells there are, and warns to come down, before a reading begins. */
export function StartReading({ visit, open, onClose }: StartReadingProps): ReactElement {
  const [source, setSource] = useState<ReadingSummary['source']>('phone');
  const [counted, setCounted] = useState<number | null>(null);
  const { state, start } = useNewReading(visit);
  return (
    <Sheet open={open} title="Start reading" onClose={onClose}>
      <div className="flex flex-col gap-6">
        {source === 'phone' && <ComeDownCard />}
        <Choices inline legend="What do you read from?" choices={SOURCE_CHOICES} value={source} onChange={setSource} />
        {source === 'paper' && (
          <FieldLink href={fieldHref({ kind: 'typed', id: visit.id })}>Type the whole sheet in, ring by ring</FieldLink>
        )}
        <CountField value={counted} onChange={setCounted} />
        {state === 'failed' && <NotSavedNotice what="the reading" />}
        <FieldButton tone="main" onClick={() => void start(source, counted)} className="text-xl">
          {state === 'saving' ? 'Saving …' : 'Read the cells'}
        </FieldButton>
      </div>
    </Sheet>
  );
}
