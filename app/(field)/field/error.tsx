'use client';

import { FieldFault } from '@/components/field/frame/field-fault';

/** What the field app shows when a screen has failed; part of the same static page. */
export default function FieldError({ reset }: { reset: () => void }) {
  return <FieldFault onRetry={reset} />;
}
