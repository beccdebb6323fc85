'use client';

import type { ReactElement } from 'react';
import { MarkGlyph } from '@/components/comb/cell-glyph';
import { chooseState, type Desk } from './desk';
import { currentMark, flipToggle, shownToggles } from './recorder-acts';
import { EverydayKeys } from './stage-keys';
import { ToggleKey } from './toggle-key';
import { UndoRow } from './undo-row';

interface KeyPadProps {
  desk: Desk;
  onMore: () => void;
}

/** Nectar and unsure: on a marked cell at once, else for the next press. They mean nothing while painting. */
function MarkToggles({ desk }: { desk: Desk }): ReactElement {
  const { recorder, mode } = desk;
  const toggles = shownToggles(recorder.view);
  const painting = mode.kind === 'paint';
  return (
    <>
      <ToggleKey
        pressed={toggles.nectar && !painting}
        disabled={painting}
        sign={<MarkGlyph mark="nectar" size={26} />}
        onPress={() => flipToggle(recorder, 'nectar')}
      >
        Nectar
      </ToggleKey>
      <ToggleKey
        pressed={toggles.unsure && !painting}
        disabled={painting}
        sign={<MarkGlyph mark="unsure" size={24} />}
        onPress={() => flipToggle(recorder, 'unsure')}
      >
        Unsure
      </ToggleKey>
    </>
  );
}

/** Does the *more* panel hold something for the current cell that its key should hint at? */
function moreWaits({ recorder, detail }: Desk): boolean {
  const { reused, scrap } = shownToggles(recorder.view);
  return reused || scrap || Boolean(detail.note) || Boolean(detail.instar);
}

/** The keys within reach of the thumb, in three columns: undo and "no cell here", the six states, the marks. */
export function KeyPad({ desk, onMore }: KeyPadProps): ReactElement {
  const { recorder, mode } = desk;
  const chosen = mode.kind === 'paint' ? mode.state : (currentMark(recorder.view)?.state ?? null);
  return (
    <div role="group" aria-label="Keys" className="hand-mirror grid grid-cols-3 gap-gap">
      <UndoRow desk={desk} />
      <EverydayKeys chosen={chosen} tally={recorder.view.tally} onPress={(state) => chooseState(desk, state)} />
      <MarkToggles desk={desk} />
      <button
        type="button"
        aria-haspopup="dialog"
        onClick={onMore}
        className={`min-h-field touch-manipulation rounded-xl border-3 border-ink font-bold select-none active:bg-main-wash ${moreWaits(desk) ? 'bg-main-wash' : 'bg-paper'}`}
      >
        More
      </button>
    </div>
  );
}
