'use client';

import { type ReactElement, useState } from 'react';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { FieldLink } from '@/components/field/parts/field-button';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { InstallHint } from '@/components/field/install/install-hint';
import { Fetching } from '@/components/field/parts/fetching';
import { Part } from '@/components/field/parts/part';
import { mayRecord, usePerson } from '@/components/field/parts/person-context';
import { Screen } from '@/components/field/parts/screen';
import { TextLine } from '@/components/field/parts/text-line';
import { LowSpace } from '@/components/field/settings/low-space';
import { fieldHref } from '@/components/field/routing/field-route';
import { useToday } from '@/components/field/words/use-today';
import { useNests } from '@/lib/offline/hooks/use-nests';
import type { NestSummary } from '@/lib/offline/nest-view';
import { NestCard } from './nest-card';
import { findNests, splitByDay } from './nest-lists';

/** From this many nests on, a search saves scrolling. */
const SEARCH_FROM = 7;

function Cards({ nests, today }: { nests: readonly NestSummary[]; today: string }): ReactElement {
  return (
    <ul className="grid grid-cols-1 gap-gap md:grid-cols-2 xl:grid-cols-3">
      {nests.map((nest) => (
        <NestCard key={nest.id} nest={nest} today={today} />
      ))}
    </ul>
  );
}

/** All nests in two groups, with a search when they are many. */
function NestGroups({ nests }: { nests: readonly NestSummary[] }): ReactElement {
  const today = useToday(usePerson().zone);
  const [words, setWords] = useState('');
  const { today: now, others } = splitByDay(findNests(nests, words), today);
  return (
    <>
      {nests.length >= SEARCH_FROM && (
        <TextLine
          id="find-nest"
          type="search"
          label="Find a nest"
          hint="By code or name, or the long code of a paper sheet."
          value={words}
          onChange={setWords}
          maxLength={200}
        />
      )}
      {now.length > 0 && (
        <Part title="Today">
          <Cards nests={now} today={today} />
        </Part>
      )}
      {others.length > 0 && (
        <Part title={now.length > 0 ? 'Other nests on this phone' : 'Nests on this phone'}>
          <Cards nests={others} today={today} />
        </Part>
      )}
      {now.length + others.length === 0 && <p role="status">No nest has these words in its code or name.</p>}
    </>
  );
}

/** The large key that starts a nest; people whose marks the office would not take are told so instead. */
function StartNest(): ReactElement {
  if (mayRecord(usePerson())) {
    return (
      <FieldLink tone="main" href={fieldHref({ kind: 'new-nest' })} className="w-full text-xl md:max-w-[40rem]">
        Start a nest
      </FieldLink>
    );
  }
  return (
    <Notice title="You can look, not record">
      <p>Nests are read by technicians, reviewers and the lead biologist.</p>
    </Notice>
  );
}

function Home({ nests }: { nests: readonly NestSummary[] }): ReactElement {
  return (
    <Screen title="Today’s nests" wide>
      <StartNest />
      {nests.length > 0 && <InstallHint />}
      {nests.length > 0 && <LowSpace />}
      {nests.length === 0 ? (
        <EmptyState title="No nest on this phone yet">
          <p>Start one at the nest, with or without signal. Nests of your team come here when there is signal.</p>
        </EmptyState>
      ) : (
        <NestGroups nests={nests} />
      )}
      <nav aria-label="More">
        <FieldLink href={fieldHref({ kind: 'settings' })}>Settings</FieldLink>
      </nav>
    </Screen>
  );
}

/** The first screen: the nests of the day, and the large key that starts another. */
export function NestsScreen(): ReactElement {
  const nests = useNests();
  return <FieldFrame help="nests">{nests ? <Home nests={nests} /> : <Fetching what="Nests" />}</FieldFrame>;
}
