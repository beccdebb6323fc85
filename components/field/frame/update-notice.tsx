'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { useServiceWorkerUpdate } from '@/lib/offline/hooks/use-service-worker-update';

/** Offers a newer version that is already on the phone. It is never taken without a press. */
export function UpdateNotice(): ReactElement | null {
  const { offered, update } = useServiceWorkerUpdate();
  const [later, setLater] = useState(false);
  if (!offered || later) return null;
  return (
    <section aria-label="Update" className="border-b-2 border-main bg-main-wash px-gap py-4">
      <p role="status" className="font-bold">
        A newer version is ready.
      </p>
      <p>It opens in a moment. Everything saved on this phone stays.</p>
      <div className="mt-3 flex flex-wrap gap-gap">
        <Button tone="main" size="field" onClick={update}>
          Update now
        </Button>
        <Button size="field" onClick={() => setLater(true)}>
          Later
        </Button>
      </div>
    </section>
  );
}
