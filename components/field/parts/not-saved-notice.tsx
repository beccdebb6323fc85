import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';

/** What a form says when the phone could not keep what was entered. Everything entered stays in the form. */
export function NotSavedNotice({ what }: { what: string }): ReactElement {
  return (
    <Notice tone="stop" live="assertive" title={`Not saved: ${what}`}>
      <p>
        The phone could not keep it. What you entered is still here: try again. If it fails again, make room on the
        phone.
      </p>
    </Notice>
  );
}
