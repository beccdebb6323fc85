import type { ReactElement } from 'react';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';

/** A nest or reading that is not there, or not this team's: both look the same. */
export default function LabNotFound(): ReactElement {
  return (
    <>
      <h1 className="sr-only">There is nothing here</h1>
      <EmptyState title="There is nothing here">
        <p>The address may be mistyped, or what it led to is not your team’s.</p>
        <LinkButton href="/nests" className="mt-4">
          To the nests
        </LinkButton>
      </EmptyState>
    </>
  );
}
