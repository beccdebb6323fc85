'use client';

import { usePathname } from 'next/navigation';
import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import { helpFor } from './help-topics';

/** What the page one is on is for: in the same place on every page, closed until it is wanted. */
export function PageHelp(): ReactElement | null {
  const path = usePathname();
  const words = helpFor(path);
  if (!words) return null;
  return (
    <Disclosure key={path} summary="What is this page?" className="print-hidden -mt-3 mb-2 text-sm">
      <div className="max-w-text text-base">
        {words.map((line) => (
          <p key={line} className="mb-1">
            {line}
          </p>
        ))}
        <p className="mb-1">
          New here?{' '}
          <a href="/start" className="underline">
            First steps
          </a>
          ,{' '}
          <a href="/tour" className="underline">
            a season step by step
          </a>
          ,{' '}
          <a href="/limits" className="underline">
            what is not known
          </a>
          .
        </p>
      </div>
    </Disclosure>
  );
}
