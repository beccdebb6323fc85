'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { useServiceWorkerUpdate } from '@/lib/offline/hooks/use-service-worker-update';

interface UpdateNoticeProps {
  /** A comb is being read: the offer waits until that is over. */
  reading: boolean;
}

/** Offers a newer version that is already on the phone. It is never taken without a press. */
export function UpdateNotice({ reading }: UpdateNoticeProps): ReactElement | null {
  const { offered, update } = useServiceWorkerUpdate();
  const [later, setLater] = useState(false);
  if (!offered || later || reading) return null;
  return (
    <section
      aria-label="Update"
      className="print-hidden border-b-2 text-field text-ink border-main bg-main-wash px-gap py-4"
    >
      <p role="status" className="font-bold">
        A newer version is ready.
      </p>
      <p>It opens in a moment. Everything saved on this phone stays.</p>
      <div className="mt-3 flex flex-wrap gap-gap">
        <FieldButton tone="main" onClick={update}>
          Update now
        </FieldButton>
        <FieldButton onClick={() => setLater(true)}>Later</FieldButton>
      </div>
    </section>
  );
}
