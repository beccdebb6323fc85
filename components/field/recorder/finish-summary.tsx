'use client';

import { type ReactElement, useState } from 'react';
import { CombPicture } from '@/components/comb/comb-picture';
import { tallyWords } from '@/components/comb/comb-view';
import { TallyLine } from '@/components/comb/tally-line';
import { FieldButton } from '@/components/field/parts/field-button';
import { BroodPreview } from '@/components/field/brood/brood-preview';
import { NotSavedNotice } from '@/components/field/parts/not-saved-notice';
import { Part } from '@/components/field/parts/part';
import { Screen } from '@/components/field/parts/screen';
import { cellsOfMarks } from '@/components/field/readings/comb-cells';
import type { Axial } from '@/lib/comb/axial';
import type { Recorder } from '@/lib/offline/recorder-view';
import { FinishChecks } from './finish-checks';
import type { NestLabel } from './nest-label';
import { NotSavedAlert } from './not-saved-alert';

interface FinishSummaryProps {
  recorder: Recorder;
  label: NestLabel;
  onBack: () => void;
}

/** Hands the reading in; `failed` turns true when the phone could not keep that. */
function useSubmit(submit: () => Promise<void>) {
  const [state, setState] = useState<'ready' | 'saving' | 'failed'>('ready');
  const press = async (): Promise<void> => {
    if (state === 'saving') return;
    setState('saving');
    try {
      await submit();
      window.scrollTo(0, 0);
      setState('ready');
    } catch {
      setState('failed');
    }
  };
  return { state, press };
}

/** The reading before it is handed in: the comb, the tally, what is open, and an estimate. */
export function FinishSummary({ recorder, label, onBack }: FinishSummaryProps): ReactElement {
  const { view } = recorder;
  const { state, press } = useSubmit(recorder.submit);
  const marks = [...view.marks.values()];
  const goTo = (cell: Axial): void => {
    recorder.jump(cell);
    onBack();
  };
  return (
    <Screen title={`Reading of ${label.title}`}>
      <NotSavedAlert recorder={recorder} />
      <Part title="What you read">
        <TallyLine tally={view.tally} />
        {marks.length > 0 && (
          <CombPicture cells={cellsOfMarks(marks)} label={`Comb: ${tallyWords(view.tally).join(', ')}`} cellSize={46} />
        )}
      </Part>
      <FinishChecks view={view} onGoTo={goTo} />
      <BroodPreview nest={view.nest} reading={view.reading} taxon={label.taxon} marks={marks} />
      {state === 'failed' && <NotSavedNotice what="that the reading is finished" />}
      <div className="flex flex-col gap-gap">
        {!view.submitted && (
          <FieldButton tone="main" className="text-xl" disabled={marks.length === 0} onClick={() => void press()}>
            {state === 'saving' ? 'Saving …' : 'Submit reading'}
          </FieldButton>
        )}
        <FieldButton onClick={onBack}>Back to the cells</FieldButton>
      </div>
      <p className="text-quiet">After that, your marks can still be corrected; each correction is shown as later.</p>
    </Screen>
  );
}
