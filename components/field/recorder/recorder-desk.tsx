'use client';

import { type ReactElement, useState } from 'react';
import { MarkGlyph } from '@/components/comb/cell-glyph';
import type { Axial } from '@/lib/comb/axial';
import { spokenWords } from '@/components/field/words/spoken-words';
import { CellLine } from './cell-line';
import { chooseState, type Desk } from './desk';
import { FurtherSheet } from './further-sheet';
import { PaintLine } from './paint-line';
import { RecorderComb } from './recorder-comb';
import { currentMark, flipToggle, shownToggles } from './recorder-acts';
import { EverydayKeys } from './stage-keys';
import { TallyHead } from './tally-head';
import { ToggleKey } from './toggle-key';
import { ToolsSheet } from './tools-sheet';
import { UndoRow } from './undo-row';
import { useRecorderKeys } from './use-recorder-keys';

interface RecorderDeskProps {
  desk: Desk;
  title: string;
  onFinish: () => void;
}

/** A small key beside the tally; *Finish* stands out once nothing is left to read. */
function SideKey({
  main = false,
  onPress,
  children,
}: {
  main?: boolean;
  onPress: () => void;
  children: string;
}): ReactElement {
  return (
    <button
      type="button"
      onClick={onPress}
      className={`min-h-field shrink-0 touch-manipulation rounded-xl border-3 px-3 font-bold select-none ${main ? 'border-main bg-main text-main-on' : 'border-ink bg-paper active:bg-main-wash'}`}
    >
      {children}
    </button>
  );
}

/** The keys within reach of the thumb, in three columns: undo and "no cell here", the six states, the marks. */
function KeyPad({ desk, onMore }: { desk: Desk; onMore: () => void }): ReactElement {
  const { recorder, mode, detail } = desk;
  const toggles = shownToggles(recorder.view);
  const chosen = mode.kind === 'paint' ? mode.state : (currentMark(recorder.view)?.state ?? null);
  const more = toggles.reused || toggles.scrap || Boolean(detail.note) || Boolean(detail.instar);
  return (
    <div role="group" aria-label="Keys" className="grid grid-cols-3 gap-gap">
      <UndoRow desk={desk} />
      <EverydayKeys chosen={chosen} tally={recorder.view.tally} onPress={(state) => chooseState(desk, state)} />
      <ToggleKey
        pressed={toggles.nectar}
        sign={<MarkGlyph mark="nectar" size={26} />}
        onPress={() => flipToggle(recorder, 'nectar')}
      >
        Nectar
      </ToggleKey>
      <ToggleKey
        pressed={toggles.unsure}
        sign={<MarkGlyph mark="unsure" size={24} />}
        onPress={() => flipToggle(recorder, 'unsure')}
      >
        Unsure
      </ToggleKey>
      <button
        type="button"
        aria-haspopup="dialog"
        onClick={onMore}
        className={`min-h-field touch-manipulation rounded-xl border-3 border-ink font-bold select-none active:bg-main-wash ${more ? 'bg-main-wash' : 'bg-paper'}`}
      >
        More
      </button>
    </div>
  );
}

/** The desk for reading one comb: the picture above, the current cell in large, the keys below. Nothing on it moves by itself. */
export function RecorderDesk({ desk, title, onFinish }: RecorderDeskProps): ReactElement {
  const [sheet, setSheet] = useState<'none' | 'more' | 'tools'>('none');
  const [whole, setWhole] = useState(false);
  const [tapped, setTapped] = useState<Axial | null>(null);
  const { view } = desk.recorder;
  const close = (): void => setSheet('none');
  useRecorderKeys(desk);
  return (
    <main className="flex flex-1 flex-col gap-2 px-gap pt-1 pb-gap lg:grid lg:grid-cols-[minmax(0,1fr)_28rem] lg:gap-8">
      <h1 className="sr-only">Reading of {title}</h1>
      <RecorderComb
        desk={desk}
        title={title}
        whole={whole}
        looking={desk.mode.kind === 'paint' ? tapped : view.current}
        onPress={setTapped}
      />
      <div className="flex flex-col gap-2 lg:justify-center lg:gap-5">
        <div className="flex min-h-field items-center gap-3">
          <TallyHead tally={view.tally} />
          <SideKey onPress={() => setSheet('tools')}>Tools</SideKey>
          <SideKey main={view.current === null} onPress={onFinish}>
            Finish
          </SideKey>
        </div>
        {desk.mode.kind === 'paint' ? <PaintLine desk={desk} mode={desk.mode} /> : <CellLine desk={desk} />}
        <KeyPad desk={desk} onMore={() => setSheet('more')} />
      </div>
      <p role="status" aria-label="Last mark" className="sr-only">
        {spokenWords(view.lastWords, view.tally.cellsTotal, view.expectedTotal)}
      </p>
      <FurtherSheet desk={desk} open={sheet === 'more'} onClose={close} />
      <ToolsSheet desk={desk} open={sheet === 'tools'} onClose={close} whole={whole} onWhole={setWhole} />
    </main>
  );
}
