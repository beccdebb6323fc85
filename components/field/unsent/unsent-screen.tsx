'use client';

import type { ReactElement } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { Fetching } from '@/components/field/parts/fetching';
import { Part } from '@/components/field/parts/part';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { type Outbox, useOutbox } from '@/lib/offline/hooks/use-outbox';
import { useSyncStatus } from '@/lib/offline/hooks/use-sync-status';
import { CopyUnsentKey } from './copy-unsent-key';
import { NeedList } from './need-list';
import { UnsentItems } from './unsent-items';
import { statusSentence } from './status-sentence';

/** How many items are on this phone only, as a heading. */
function unsentTitle({ waiting, unsaved }: Outbox): string {
  const all = waiting + unsaved;
  return all === 0 ? 'Nothing is unsent' : `Still on this phone: ${countWords(all, 'item')}`;
}

function UnsentBody({ outbox }: { outbox: Outbox }): ReactElement {
  const { status } = useSyncStatus();
  return (
    <Screen title={unsentTitle(outbox)} under={statusSentence(status)}>
      {outbox.unsaved > 0 && (
        <Notice tone="stop" live="assertive" title={`Not saved: ${countWords(outbox.unsaved, 'press', 'presses')}`}>
          <p>
            The phone could not keep them. Keep this app open, go back to the reading and try again, or make a copy now.
          </p>
        </Notice>
      )}
      {status.kind === 'needs-you' && <NeedList needs={status.needs} />}
      <div className="flex flex-wrap gap-gap">
        <FieldButton tone="main" onClick={outbox.sendNow} disabled={outbox.busy} className="flex-1 text-xl">
          {outbox.busy ? 'Sending …' : 'Send now'}
        </FieldButton>
      </div>
      {outbox.attention.length > 0 && (
        <Part title="These need you">
          <UnsentItems items={outbox.attention} />
          <FieldButton onClick={() => void outbox.acknowledge()}>I have seen these</FieldButton>
        </Part>
      )}
      {outbox.queue.length > 0 && (
        <Part title="Waiting to send">
          <UnsentItems items={outbox.queue} />
          {outbox.waiting > outbox.queue.length && <p>… and {outbox.waiting - outbox.queue.length} more.</p>}
        </Part>
      )}
      <Part title="A copy to hand over">
        <p>
          One file with everything that is not at the office. It can be given over by cable or message and removes
          nothing here.
        </p>
        <CopyUnsentKey>Copy of everything unsent</CopyUnsentKey>
        <FieldLink href={fieldHref({ kind: 'bring-in' })}>Take in a copy from another phone</FieldLink>
      </Part>
      <FieldLink href={fieldHref({ kind: 'settings' })}>Settings</FieldLink>
    </Screen>
  );
}

/** What is not at the office yet, in plain words, and what can be done about it. */
export function UnsentScreen(): ReactElement {
  const outbox = useOutbox();
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} help="unsent">
      {outbox ? <UnsentBody outbox={outbox} /> : <Fetching what="Unsent work" />}
    </FieldFrame>
  );
}
