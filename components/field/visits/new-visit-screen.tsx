'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { NearNestCard } from '@/components/field/cautions/near-nest-card';
import { StingCard } from '@/components/field/cautions/sting-card';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { nestTitle } from '@/components/field/nests/nest-lists';
import { Choices } from '@/components/field/parts/choices';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { NotSavedNotice } from '@/components/field/parts/not-saved-notice';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { goInstead } from '@/components/field/routing/use-field-path';
import { PURPOSES } from '@/components/field/words/reading-words';
import { useCommands } from '@/lib/offline/hooks/use-commands';
import { useNest } from '@/lib/offline/hooks/use-nest';
import type { NestView, VisitView } from '@/lib/offline/nest-view';

const PURPOSE_CHOICES = PURPOSES.map(({ purpose, title, hint }) => ({ value: purpose, title, hint }));

/** Keeps the new visit and shows it. */
function useNewVisit(nest: string, purpose: VisitView['purpose']) {
  const commands = useCommands();
  const [state, setState] = useState<'ready' | 'saving' | 'failed'>('ready');
  const start = async (): Promise<void> => {
    if (!commands || state === 'saving') return;
    setState('saving');
    try {
      const id = await commands.openVisit({ nest, purpose });
      goInstead(fieldHref({ kind: 'visit', id }));
    } catch {
      setState('failed');
    }
  };
  return { state, start };
}

function NewVisit({ nest }: { nest: NestView }): ReactElement {
  const [purpose, setPurpose] = useState<VisitView['purpose']>(nest.visits === 0 ? 'take-down' : 'check');
  const { state, start } = useNewVisit(nest.id, purpose);
  return (
    <Screen title="Start a visit" under={nestTitle(nest)}>
      <NearNestCard />
      <Choices legend="What is the visit for?" choices={PURPOSE_CHOICES} value={purpose} onChange={setPurpose} />
      {state === 'failed' && <NotSavedNotice what="the visit" />}
      <FieldButton tone="main" onClick={() => void start()} className="text-xl">
        {state === 'saving' ? 'Saving …' : 'Start the visit'}
      </FieldButton>
      <StingCard />
    </Screen>
  );
}

/** Starts a visit: what it is for, and what to settle before going near. */
export function NewVisitScreen({ id }: { id: string }): ReactElement {
  const nest = useNest(id);
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'nest', id }), to: 'the nest' }} help="new-visit">
      {nest === undefined && <Fetching what="Nest" />}
      {nest === null && <NotOnThisPhone what="nest" />}
      {nest && <NewVisit nest={nest} />}
    </FieldFrame>
  );
}
