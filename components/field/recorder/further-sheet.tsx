'use client';

import { type ReactElement, useState } from 'react';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { FieldButton } from '@/components/field/parts/field-button';
import { Sheet } from '@/components/field/parts/sheet';
import { cellTitle } from '@/components/field/words/cell-words';
import type { CellState } from '@/lib/comb/states';
import { chooseState, type Desk } from './desk';
import { InstarKeys } from './instar-keys';
import { currentMark, flipToggle, putDetail, shownToggles } from './recorder-acts';
import { FurtherKeys } from './stage-keys';
import { ToggleKey } from './toggle-key';

interface FurtherSheetProps {
  desk: Desk;
  open: boolean;
  onClose: () => void;
}

/** The note of the cell: kept by its key on a marked cell, else with the state that is pressed next. */
function NoteField({ desk }: { desk: Desk }): ReactElement {
  const { detail, setDetail } = desk;
  const mark = currentMark(desk.recorder.view);
  const [text, setText] = useState(mark?.note ?? detail.note ?? '');
  const note = text.trim() || null;
  return (
    <Field
      id="cell-note"
      label="Note"
      hint={
        mark ? undefined : <span className="text-field">It is saved with the state you press next for this cell.</span>
      }
    >
      {(control) => (
        <>
          <TextArea
            {...control}
            value={text}
            maxLength={10_000}
            onChange={(event) => {
              setText(event.target.value);
              if (!mark) setDetail({ ...detail, note: event.target.value.trim() || null });
            }}
            className="border-3 text-field"
          />
          {mark && note !== mark.note && (
            <FieldButton tone="main" onClick={() => putDetail(desk.recorder, { note })}>
              Save the note
            </FieldButton>
          )}
        </>
      )}
    </Field>
  );
}

/** What can be said of one cell besides its state; nothing of it is painted. */
function CellDetails({ desk }: { desk: Desk }): ReactElement {
  const { recorder, detail, setDetail } = desk;
  const mark = currentMark(recorder.view);
  const toggles = shownToggles(recorder.view);
  const putInstar = (instar: number | null): void =>
    mark ? putDetail(recorder, { instar }) : setDetail({ ...detail, instar });
  return (
    <>
      <div className="grid grid-cols-2 gap-gap">
        <ToggleKey pressed={toggles.reused} onPress={() => flipToggle(recorder, 'reused')}>
          Reused
        </ToggleKey>
        <ToggleKey pressed={toggles.scrap} onPress={() => flipToggle(recorder, 'scrap')}>
          Prey scrap
        </ToggleKey>
      </div>
      <InstarKeys value={mark ? mark.instar : (detail.instar ?? null)} onChange={putInstar} />
      <NoteField desk={desk} />
    </>
  );
}

function FurtherBody({ desk, onClose }: Omit<FurtherSheetProps, 'open'>): ReactElement {
  const { recorder, mode } = desk;
  const painting = mode.kind === 'paint';
  const press = (state: CellState): void => {
    chooseState(desk, state);
    onClose();
  };
  return (
    <div className="flex flex-col gap-6">
      <FurtherKeys
        tally={recorder.view.tally}
        chosen={painting ? mode.state : (currentMark(recorder.view)?.state ?? null)}
        onPress={press}
      />
      {!painting && recorder.view.current && <CellDetails desk={desk} />}
    </div>
  );
}

/** What is seldom needed for a cell: the other six states, two marks, the instar and a note. */
export function FurtherSheet({ desk, open, onClose }: FurtherSheetProps): ReactElement {
  const title =
    desk.mode.kind === 'paint' ? 'More to paint' : `More for ${cellTitle(desk.recorder.view.current).toLowerCase()}`;
  return (
    <Sheet open={open} title={title} onClose={onClose}>
      <FurtherBody desk={desk} onClose={onClose} />
    </Sheet>
  );
}
