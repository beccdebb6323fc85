'use client';

import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { useOnline } from './use-online';

/** Says that the lab pages need the network, and that the phone app does not. */
export function OfflineNotice(): ReactElement | null {
  const isOnline = useOnline();
  if (isOnline) return null;
  return (
    <Notice tone="warn" live="polite" title="No network" className="print-hidden mb-5">
      <p>
        What is on this page may be old, and nothing can be stored from it.{' '}
        <a href="/field" className="underline">
          The phone app
        </a>{' '}
        works without a network.
      </p>
    </Notice>
  );
}
