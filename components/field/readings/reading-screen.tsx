'use client';

import { type ReactElement, useState } from 'react';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { RecorderScreen } from '@/components/field/recorder/recorder-screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { useRecorder } from '@/lib/offline/hooks/use-recorder';
import { ReadOnly } from './read-only';

/** One reading: the recorder for the person who makes it, a picture to look at for everybody else and afterwards. */
export function ReadingScreen({ id }: { id: string }): ReactElement {
  const recorder = useRecorder(id);
  const [correcting, setCorrecting] = useState(false);
  if (!recorder) {
    return (
      <FieldFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} help="visit">
        {recorder === undefined ? <Fetching what="Reading" /> : <NotOnThisPhone what="reading" />}
      </FieldFrame>
    );
  }
  const { mayMark, submitted, visit } = recorder.view;
  if (mayMark && (!submitted || correcting)) return <RecorderScreen key={id} recorder={recorder} />;
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'visit', id: visit }), to: 'the visit' }} help="reading">
      <ReadOnly id={id} onCorrect={mayMark ? () => setCorrecting(true) : null} />
    </FieldFrame>
  );
}
