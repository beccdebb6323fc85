'use client';

import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Screen } from '@/components/field/parts/screen';
import { FIELD_ROOT } from '@/components/field/routing/field-route';

/** A screen failed. The records are not touched by that; says so, and offers two ways on. */
export function FieldFault({ onRetry }: { onRetry: () => void }): ReactElement {
  return (
    <div className="min-h-dvh bg-paper text-field text-ink">
      <Screen title="This screen failed">
        <p role="alert">What was shown as saved is still saved on this phone. Try again; if it fails again, go to the nests.</p>
        <div className="flex flex-wrap gap-gap">
          <Button tone="main" size="field" onClick={onRetry}>
            Try again
          </Button>
          <LinkButton size="field" href={FIELD_ROOT}>
            To the nests
          </LinkButton>
        </div>
      </Screen>
    </div>
  );
}
