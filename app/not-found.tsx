import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PlainFrame } from '@/components/shell/plain-frame';
import { LinkButton } from '@/components/ui/link-button';

export const metadata: Metadata = { title: 'Nothing here' };

/** An address that leads nowhere; built ahead, so it knows nobody. */
export default function NotFound(): ReactElement {
  return (
    <PlainFrame>
      <h1 className="text-2xl font-bold">There is nothing here</h1>
      <p className="mt-3">The address may be mistyped, or what it led to belongs to another team.</p>
      <div className="mt-6 flex flex-wrap gap-3">
        <LinkButton href="/" tone="main">
          To the start
        </LinkButton>
        <LinkButton href="/field">Phone app</LinkButton>
      </div>
    </PlainFrame>
  );
}
