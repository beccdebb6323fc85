'use client';

import type { ReactElement } from 'react';
import { useSession } from '@/lib/offline/hooks/use-session';
import { useStanding } from '@/lib/offline/hooks/use-standing';
import { FieldScreen } from './field-screen';
import { SignedOut } from './frame/signed-out';
import { OtherTabFirst, TakenOverNotice } from './frame/tab-notice';
import { UpdateNotice } from './frame/update-notice';
import { useHandOnDocument } from './hand/use-hand';
import { useInstallState } from './install/install-ways';
import { Fetching } from './parts/fetching';
import { PersonProvider } from './parts/person-context';
import { parseFieldPath } from './routing/field-route';
import { InnerLinks } from './routing/inner-links';
import { useFieldPath } from './routing/use-field-path';

/** The whole field app in one static page: who works here, then the screen the path names. Opens without network. */
export function FieldApp(): ReactElement {
  const path = useFieldPath();
  const { view } = useSession();
  const { tab } = useStanding();
  useHandOnDocument();
  // From the start: a browser offers to install once, early.
  useInstallState();
  if (tab === 'blocked') return <OtherTabFirst />;
  if (path === null || view.kind === 'loading') {
    return (
      <div className="min-h-dvh bg-paper text-field text-ink">
        <Fetching what="Undereave" />
      </div>
    );
  }
  if (view.kind === 'signed-out') return <SignedOut reachable={view.reachable} />;
  return (
    <PersonProvider person={view.person}>
      <InnerLinks>
        <TakenOverNotice />
        <UpdateNotice reading={parseFieldPath(path).kind === 'reading'} />
        <FieldScreen path={path} />
      </InnerLinks>
    </PersonProvider>
  );
}
