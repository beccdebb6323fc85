'use client';

import type { ReactElement } from 'react';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { Screen } from '@/components/field/parts/screen';
import { FIELD_ROOT } from '@/components/field/routing/field-route';

/** A screen failed. The records are not touched by that; says so, and offers two ways on. */
export function FieldFault({ onRetry }: { onRetry: () => void }): ReactElement {
  return (
    <div className="min-h-dvh bg-paper text-field text-ink">
      <Screen title="This screen failed">
        <p role="alert">
          What was shown as saved is still saved on this phone. Try again; if it fails again, go to the nests.
        </p>
        <div className="flex flex-wrap gap-gap">
          <FieldButton tone="main" onClick={onRetry}>
            Try again
          </FieldButton>
          <FieldLink href={FIELD_ROOT}>To the nests</FieldLink>
        </div>
      </Screen>
    </div>
  );
}
