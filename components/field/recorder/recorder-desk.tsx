'use client';

import { type ReactElement, useState } from 'react';
import type { Expectation } from '@/components/field/brood/use-expectation';
import { FieldButton } from '@/components/field/parts/field-button';
import { spokenWords } from '@/components/field/words/spoken-words';
import type { Axial } from '@/lib/comb/axial';
import type { Recorder, RecorderView } from '@/lib/offline/recorder-view';
import { CellLine } from './cell-line';
import { ExpectedKey } from './expected-key';
import { ExpectedSheet } from './expected-sheet';
import { FurtherSheet } from './further-sheet';
import { KeyPad } from './key-pad';
import { NoCellSheet } from './no-cell-sheet';
import { PaintLine } from './paint-line';
import { RecorderComb } from './recorder-comb';
import { SideKey } from './side-key';
import { SurpriseSheet } from './surprise-sheet';
import { TallyHead } from './tally-head';
import { ToolsSheet } from './tools-sheet';
import { useDesk } from './use-desk';
import { useLookedAt } from './use-looked-at';
import { useRecorderKeys } from './use-recorder-keys';
import { useSurprise } from './use-surprise';

interface RecorderDeskProps {
  recorder: Recorder;
  title: string;
  expectation: Expectation;
  onFinish: () => void;
}

/** The panel that lies over the desk. */
type OpenSheet = 'none' | 'more' | 'tools' | 'no-cell' | 'expected';

/** What the last press did, for those who listen. */
function LastMark({ view }: { view: RecorderView }): ReactElement {
  return (
    <p role="status" aria-label="Last mark" className="sr-only">
      {spokenWords(view.lastWords, view.tally.cellsTotal, view.expectedTotal)}
    </p>
  );
}

/** The desk for reading one comb: the picture above, the current cell in large, the keys below. Nothing moves by itself. */
export function RecorderDesk({ recorder, title, expectation, onFinish }: RecorderDeskProps): ReactElement {
  const [sheet, setSheet] = useState<OpenSheet>('none');
  const [whole, setWhole] = useState(false);
  const [tapped, setTapped] = useState<Axial | null>(null);
  const { view } = recorder;
  const { surprising, marked, answered } = useSurprise(view, expectation);
  const desk = useDesk(recorder, { askNoCell: () => setSheet('no-cell'), expected: expectation.states, marked });
  const looked = useLookedAt(view.current);
  const painting = desk.mode.kind === 'paint';
  const close = (): void => setSheet('none');
  // A tool may have opened another panel in its place: closing this one must not take that away.
  const closeTools = (): void => setSheet((now) => (now === 'tools' ? 'none' : now));
  useRecorderKeys(desk);
  return (
    <main className="hand-mirror flex flex-1 flex-col gap-2 px-gap pt-1 pb-gap lg:grid lg:grid-cols-[minmax(0,1fr)_28rem] lg:gap-8">
      <h1 className="sr-only">Reading of {title}</h1>
      <RecorderComb
        desk={desk}
        title={title}
        whole={whole}
        looking={painting ? tapped : view.current}
        onPress={setTapped}
      />
      <div className="flex flex-col gap-2 lg:justify-center lg:gap-5">
        <div className="hand-mirror flex min-h-field flex-wrap items-center gap-3">
          <TallyHead tally={view.tally} />
          <SideKey onPress={() => setSheet('tools')}>Tools</SideKey>
          <SideKey main={view.current === null} onPress={onFinish}>
            Finish
          </SideKey>
        </div>
        {desk.mode.kind === 'paint' ? <PaintLine desk={desk} mode={desk.mode} /> : <CellLine desk={desk} />}
        <ExpectedKey desk={desk} standing={expectation.standing} />
        <KeyPad desk={desk} onMore={() => setSheet('more')} />
      </div>
      <LastMark view={view} />
      <FurtherSheet desk={desk} open={sheet === 'more'} onClose={close} />
      <ToolsSheet desk={desk} open={sheet === 'tools'} onClose={closeTools} whole={whole} onWhole={setWhole}>
        {desk.expected.size > 0 && <FieldButton onClick={() => setSheet('expected')}>The rest as expected</FieldButton>}
      </ToolsSheet>
      <ExpectedSheet desk={desk} looked={looked} open={sheet === 'expected'} onClose={close} />
      <SurpriseSheet recorder={recorder} surprising={surprising} onClose={answered} />
      <NoCellSheet recorder={recorder} open={sheet === 'no-cell'} onClose={close} />
    </main>
  );
}
