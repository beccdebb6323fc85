'use client';

import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { setHand } from '@/components/field/hand/hand-settings';
import { useHand } from '@/components/field/hand/use-hand';
import { InstallWays, useInstallState } from './install-ways';

/** Once there is something to lose: how to put the app on the home screen. Put away by hand, for good. */
export function InstallHint(): ReactElement | null {
  const state = useInstallState();
  const { hintSeen } = useHand();
  if (hintSeen || state === 'installed' || state === 'menu') return null;
  return (
    <Notice title="Put the app on the home screen">
      <InstallWays />
      <FieldButton className="mt-3" onClick={() => setHand('hintSeen', true)}>
        Not now
      </FieldButton>
    </Notice>
  );
}
