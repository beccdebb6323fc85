'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { NotSavedNotice } from '@/components/field/parts/not-saved-notice';
import { Screen } from '@/components/field/parts/screen';
import { TextLine } from '@/components/field/parts/text-line';
import { fieldHref } from '@/components/field/routing/field-route';
import { goInstead } from '@/components/field/routing/use-field-path';
import { keepStorage } from '@/components/field/settings/storage-space';
import { useCommands } from '@/lib/offline/hooks/use-commands';
import type { Place } from '@/lib/offline/nest-view';
import { PlaceField } from './place-field';

interface NestForm {
  code: string;
  name: string;
  taxon: string;
  place: Place | null;
}

const BLANK: NestForm = { code: '', name: '', taxon: '', place: null };

/** Text as it is stored: without space at the ends, null when there is none. */
const textOrNull = (text: string): string | null => text.trim() || null;

/** Keeps the new nest and shows it. `failed` turns true when the phone could not. */
function useNewNest(form: NestForm) {
  const commands = useCommands();
  const [state, setState] = useState<'ready' | 'no-code' | 'saving' | 'failed'>('ready');
  const start = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    const code = form.code.trim();
    if (code === '') return setState('no-code');
    if (!commands || state === 'saving') return;
    setState('saving');
    try {
      const id = await commands.openNest({
        code,
        name: textOrNull(form.name),
        taxon: textOrNull(form.taxon),
        place: form.place,
      });
      void keepStorage();
      goInstead(fieldHref({ kind: 'nest', id }));
    } catch {
      setState('failed');
    }
  };
  return { state, start };
}

/** Starts a nest: a code is enough, the rest can wait. */
export function NewNestScreen(): ReactElement {
  const [form, setForm] = useState(BLANK);
  const { state, start } = useNewNest(form);
  const put = (part: Partial<NestForm>): void => setForm({ ...form, ...part });
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} help="new-nest">
      <Screen title="Start a nest">
        <form onSubmit={(event) => void start(event)} noValidate className="flex flex-col gap-6">
          <TextLine
            id="nest-code"
            label="Code"
            hint="As on the label, such as N12."
            value={form.code}
            onChange={(code) => put({ code })}
            maxLength={40}
            required
            error={state === 'no-code' ? 'A nest needs a code. Any short one will do.' : null}
          />
          <TextLine
            id="nest-name"
            label="Where it hangs"
            hint="Such as Bandstand roof. Can wait."
            value={form.name}
            onChange={(name) => put({ name })}
            maxLength={200}
          />
          <TextLine
            id="nest-taxon"
            label="Taxon"
            hint="Scientific name, if you are sure of it. Can wait."
            value={form.taxon}
            onChange={(taxon) => put({ taxon })}
            maxLength={200}
          />
          <PlaceField place={form.place} onChange={(place) => put({ place })} />
          {state === 'failed' && <NotSavedNotice what="the nest" />}
          <FieldButton type="submit" tone="main" className="text-xl">
            {state === 'saving' ? 'Saving …' : 'Start the nest'}
          </FieldButton>
        </form>
      </Screen>
    </FieldFrame>
  );
}
