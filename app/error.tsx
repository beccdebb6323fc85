'use client';

import type { ReactElement } from 'react';
import { Failure } from '@/components/shell/failure';
import { PlainFrame } from '@/components/shell/plain-frame';

interface ErrorPageProps {
  error: unknown;
  retry: () => void;
}

/** A page outside the lab that failed. */
export default function ErrorPage({ error, retry }: ErrorPageProps): ReactElement {
  return (
    <PlainFrame>
      <Failure error={error} onRetry={retry} />
    </PlainFrame>
  );
}
