'use client';

import { type ReactElement, useEffect, useEffectEvent, useState } from 'react';
import { useExpectation } from '@/components/field/brood/use-expectation';
import { FieldFrame } from '@/components/field/frame/field-frame';
import type { PressState } from '@/components/field/frame/corner-status';
import { usePressFeedback } from '@/components/field/hand/use-press-feedback';
import { fieldHref } from '@/components/field/routing/field-route';
import type { Recorder, RecorderView } from '@/lib/offline/recorder-view';
import { countedOf } from './counted-query';
import { FinishSummary } from './finish-summary';
import { type NestLabel, useNestLabel } from './nest-label';
import { RecorderDesk } from './recorder-desk';
import { useWakeLock } from './use-wake-lock';

/** What the corner must say about presses the queue does not know of yet. */
function pressState({ unsaved, pending }: Pick<RecorderView, 'unsaved' | 'pending'>): PressState {
  if (unsaved.length > 0) return 'not-saved';
  return pending > 0 ? 'saving' : null;
}

/** Takes over, once, the number of cells counted when the reading was started. */
function useCounted(recorder: Recorder): void {
  const take = useEffectEvent(() => {
    const counted = countedOf(window.location.search);
    if (counted === null) return;
    if (recorder.view.expectedTotal === null) recorder.expect(counted);
    window.history.replaceState(null, '', window.location.pathname);
  });
  useEffect(() => take(), []);
}

function HeaderTitle({ label }: { label: NestLabel }): ReactElement {
  return (
    <p className="min-w-0">
      <span className="block truncate font-bold">{label.code}</span>
      {label.name && <span className="block truncate">{label.name}</span>}
    </p>
  );
}

/** Reading a comb, from the first cell to handing in. */
export function RecorderScreen({ recorder }: { recorder: Recorder }): ReactElement {
  const { view } = recorder;
  const { label, reader } = useNestLabel(view.nest);
  const [finishing, setFinishing] = useState(false);
  const turnTo = (summary: boolean): void => {
    setFinishing(summary);
    window.scrollTo(0, 0);
  };
  const expectation = useExpectation(view, label.taxon);
  useWakeLock();
  usePressFeedback(view);
  useCounted(recorder);
  return (
    <FieldFrame
      back={{ href: fieldHref({ kind: 'visit', id: view.visit }), to: 'the visit' }}
      title={<HeaderTitle label={label} />}
      help="recorder"
      reading
      press={pressState(view)}
    >
      {reader}
      {finishing ? (
        <FinishSummary recorder={recorder} label={label} onBack={() => turnTo(false)} />
      ) : (
        <RecorderDesk recorder={recorder} title={label.title} expectation={expectation} onFinish={() => turnTo(true)} />
      )}
    </FieldFrame>
  );
}
