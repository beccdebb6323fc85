'use client';

import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';

/** On paper: this comb with its key, and the blank sheet of the nest, whose page belongs to the field app. */
export function PaperLinks({ nest }: { nest: string }): ReactElement {
  return (
    <p className="print-hidden mt-4 flex flex-wrap gap-3">
      <Button onClick={() => window.print()}>Print</Button>
      <LinkButton href={`/field/nests/${nest}/sheet`}>Paper field sheet</LinkButton>
    </p>
  );
}
