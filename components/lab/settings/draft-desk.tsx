'use client';

import { type ReactElement, useMemo, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useKeep } from '@/components/lab/use-keep';
import type { SettingsTrouble } from '@/lib/brood/team-settings/check-content';
import { compareContent } from '@/lib/brood/team-settings/compare-content';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import { ConfusionFields } from './confusion-fields';
import { draftForm, readDraftForm } from './draft-form';
import { DurationFields } from './duration-fields';
import { ImpactSection } from './impact-section';
import { NumberFields } from './number-fields';
import { SignSection } from './sign-section';

interface DraftDeskProps {
  basedOn: number;
  /** The version in force. */
  current: SettingsContent;
  /** What is saved as the draft; null before the first save. */
  saved: SettingsContent | null;
}

/** Everything in the fields that cannot stand, in words. */
function Troubles({
  troubles,
  words,
}: {
  troubles: readonly SettingsTrouble[];
  words: string | null;
}): ReactElement | null {
  const lines = troubles.length > 0 ? troubles.map(({ text }) => text) : (words?.split('\n') ?? []);
  if (lines.length === 0) return null;
  return (
    <Notice tone="stop" live="assertive" title="The draft was not saved" className="my-3">
      <ul>
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** Fields for the whole draft, what it would move, and its signing. */
export function DraftDesk({ basedOn, current, saved }: DraftDeskProps): ReactElement {
  const [form, setForm] = useState(() => draftForm(saved ?? current));
  const [isTouched, setTouched] = useState(false);
  const [troubles, setTroubles] = useState<SettingsTrouble[]>([]);
  const { send, isSending, trouble } = useKeep(() => setTouched(false));
  const wrong = useMemo(() => new Set(troubles.map(({ field }) => field)), [troubles]);
  const edit = (next: typeof form): void => {
    setForm(next);
    setTouched(true);
  };
  const save = (): void => {
    const read = readDraftForm(form);
    setTroubles(read.ok ? [] : read.error);
    if (read.ok) send({ method: 'PUT', path: '/api/settings/draft', body: read.value });
  };
  const isSaved = saved !== null && !isTouched;
  return (
    <>
      <DurationFields form={form} onChange={edit} wrong={wrong} />
      <NumberFields form={form} onChange={edit} wrong={wrong} />
      <ConfusionFields form={form} onChange={edit} wrong={wrong} />
      <div className="sticky bottom-0 mt-6 border-t-2 border-ink bg-paper py-3">
        <Troubles troubles={troubles} words={trouble} />
        <div className="flex flex-wrap items-center gap-3">
          <Button tone="main" onClick={save} disabled={isSending || isSaved}>
            {isSending ? 'Saving …' : 'Save the draft'}
          </Button>
          <p role="status" className="text-quiet">
            {isSaved ? 'Saved. It changes nothing before it is signed.' : 'Not saved yet.'}
          </p>
        </div>
      </div>
      <ImpactSection canLook={isSaved} />
      <SignSection basedOn={basedOn} changes={compareContent(current, saved ?? current)} canSign={isSaved} />
    </>
  );
}
