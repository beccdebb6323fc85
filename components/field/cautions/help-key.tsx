'use client';

import { type ReactElement, useState } from 'react';
import { Sheet } from '@/components/field/parts/sheet';
import { HELP, type HelpTopic } from './help-topics';
import { StingCard } from './sting-card';

/** The question mark in the same place on every screen: help for that screen, and what to do after a sting. */
export function HelpKey({ topic }: { topic: HelpTopic }): ReactElement {
  const [open, setOpen] = useState(false);
  const { title, Body } = HELP[topic];
  return (
    <>
      <button
        type="button"
        aria-label="Help"
        onClick={() => setOpen(true)}
        className="flex min-h-field min-w-field shrink-0 items-center justify-center rounded-xl hover:bg-wash"
      >
        <span
          aria-hidden="true"
          className="size-9 rounded-full border-3 border-ink text-2xl leading-[1.7rem] font-bold"
        >
          ?
        </span>
      </button>
      <Sheet open={open} title={title} onClose={() => setOpen(false)}>
        <div className="flex flex-col gap-5">
          <Body />
          <StingCard />
        </div>
      </Sheet>
    </>
  );
}
