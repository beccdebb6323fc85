'use client';

import type { ReactElement } from 'react';
import { Failure } from '@/components/shell/failure';

interface LabErrorProps {
  error: unknown;
  retry: () => void;
}

/** A lab page that failed; header and way out stay. */
export default function LabError({ error, retry }: LabErrorProps): ReactElement {
  return <Failure error={error} onRetry={retry} />;
}
