'use client';

import { type ReactElement, useState } from 'react';
import { CombPicture } from '@/components/comb/comb-picture';
import { TallyLine } from '@/components/comb/tally-line';
import { tallyWords } from '@/components/comb/comb-view';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { nestTitle } from '@/components/field/nests/nest-lists';
import { FieldButton } from '@/components/field/parts/field-button';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { NotSavedNotice } from '@/components/field/parts/not-saved-notice';
import { Part } from '@/components/field/parts/part';
import { mayRecord, usePerson } from '@/components/field/parts/person-context';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { goInstead } from '@/components/field/routing/use-field-path';
import { useToday } from '@/components/field/words/use-today';
import { writtenTime } from '@/components/field/words/written-time';
import { purposeWord } from '@/components/field/words/reading-words';
import type { SheetLine, SheetMark } from '@/lib/comb/sheet-letters';
import { readSheet } from '@/lib/comb/sheet-letters';
import { tallyOf } from '@/lib/comb/tally';
import { useCommands } from '@/lib/offline/hooks/use-commands';
import { useNest } from '@/lib/offline/hooks/use-nest';
import { useVisit } from '@/lib/offline/hooks/use-visit';
import type { VisitView } from '@/lib/offline/nest-view';
import { RingLine } from './ring-line';
import { SHEET_RINGS } from './sheet-comb';
import { useLeaveGuard } from './use-leave-guard';

const EMPTY_SHEET: readonly string[] = Array.from({ length: SHEET_RINGS + 1 }, () => '');

/** Keeps the reading with all its marks at once and opens it, so that it can be checked against the paper. */
function useTypedReading(visit: VisitView, lines: readonly SheetLine[]) {
  const commands = useCommands();
  const [state, setState] = useState<'ready' | 'saving' | 'kept' | 'failed'>('ready');
  const keep = async (): Promise<void> => {
    if (!commands || state === 'saving') return;
    setState('saving');
    try {
      const marks = lines.flatMap((line) => line.marks);
      const id = await commands.openTypedReading({ nest: visit.nest, visit: visit.id, marks });
      setState('kept');
      goInstead(fieldHref({ kind: 'reading', id }));
    } catch {
      setState('failed');
    }
  };
  return { state, keep };
}

/** The comb as typed so far. */
function TypedComb({ marks }: { marks: readonly SheetMark[] }): ReactElement {
  const tally = tallyOf(marks);
  if (marks.length === 0) return <p className="text-quiet">The comb is drawn here as you type.</p>;
  const words = [countWords(marks.length, 'cell'), ...tallyWords(tally)].join(', ');
  return (
    <>
      <CombPicture cells={[...marks]} label={`Comb as typed: ${words}`} cellSize={34} />
      <TallyLine tally={tally} />
    </>
  );
}

/** The key that keeps the reading, and why it does not yet. */
function KeepKey({
  lines,
  saving,
  onKeep,
}: {
  lines: readonly SheetLine[];
  saving: boolean;
  onKeep: () => void;
}): ReactElement {
  const faults = lines.flatMap((line) => line.faults);
  const count = lines.reduce((sum, line) => sum + line.marks.length, 0);
  const ready = faults.length === 0 && count > 0;
  return (
    <>
      {faults.length > 0 && (
        <Notice tone="warn" title={`${countWords(faults.length, 'sign')} to put right`}>
          <p>The lines above say which.</p>
        </Notice>
      )}
      <FieldButton tone="main" aria-disabled={!ready} onClick={() => ready && onKeep()} className="text-xl">
        {saving ? 'Saving …' : `Keep the reading (${countWords(count, 'cell')})`}
      </FieldButton>
    </>
  );
}

function TypedBody({ visit }: { visit: VisitView }): ReactElement {
  const nest = useNest(visit.nest);
  const today = useToday(usePerson().zone);
  const [texts, setTexts] = useState(EMPTY_SHEET);
  const lines = readSheet(texts);
  const { state, keep } = useTypedReading(visit, lines);
  useLeaveGuard(state !== 'kept' && texts.some((text) => text !== ''));
  const put = (k: number, text: string): void => setTexts(texts.map((old, at) => (at === k ? text : old)));
  return (
    <Screen
      title="Type in a paper sheet"
      under={`${nest ? `${nestTitle(nest)} · ` : ''}${purposeWord(visit.purpose)}, ${writtenTime(visit.startedAt, today)}`}
      wide
    >
      <div className="grid gap-8 lg:grid-cols-2">
        <div className="flex flex-col gap-gap">
          <p>
            One letter a cell, in the order of the numbers. <kbd className="font-mono font-bold">’</kbd> behind a letter
            is nectar, <kbd className="font-mono font-bold">?</kbd> unsure, <kbd className="font-mono font-bold">.</kbd>{' '}
            a place without a cell, <kbd className="font-mono font-bold">u</kbd> a blank inside the line.
          </p>
          {lines.map((line, k) => (
            <RingLine key={k} ring={k} text={texts[k] ?? ''} line={line} onChange={(text) => put(k, text)} />
          ))}
          <FieldButton onClick={() => setTexts([...texts, ''])}>One more ring</FieldButton>
        </div>
        <div className="flex flex-col gap-gap">
          <Part title="The comb">
            <TypedComb marks={lines.flatMap((line) => line.marks)} />
          </Part>
          {state === 'failed' && <NotSavedNotice what="the reading" />}
          <KeepKey lines={lines} saving={state === 'saving'} onKeep={() => void keep()} />
          <p className="text-quiet">
            It is kept in your name as read from paper, and opens so that you can check it and hand it in.
          </p>
        </div>
      </div>
    </Screen>
  );
}

/** Typing a filled paper sheet in at its visit, from the keyboard. */
export function TypedScreen({ id }: { id: string }): ReactElement {
  const visit = useVisit(id);
  const may = mayRecord(usePerson());
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'visit', id }), to: 'the visit' }} help="typed">
      {visit === undefined && <Fetching what="Visit" />}
      {(visit === null || (visit && !may)) && <NotOnThisPhone what="visit" />}
      {visit && may && <TypedBody visit={visit} />}
    </FieldFrame>
  );
}
