'use client';

import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';

/** Prints the review sheet: both combs, the differences with their reasons, and the names. */
export function PrintKey(): ReactElement {
  return (
    <Button className="print-hidden" onClick={() => window.print()}>
      Print the sheet
    </Button>
  );
}
