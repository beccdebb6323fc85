'use client';

import type { ReactElement, ReactNode } from 'react';
import { HelpKey } from '@/components/field/cautions/help-key';
import type { HelpTopic } from '@/components/field/cautions/help-topics';
import { FIELD_ROOT } from '@/components/field/routing/field-route';
import { Mark } from '@/components/shell/mark';
import { ClockNotice } from './clock-notice';
import { CornerStatus, type PressState } from './corner-status';
import { SignInAgain } from './sign-in-again';

interface FieldFrameProps {
  /** Where the back key leads, and the name of that place; the home screen has none. */
  back?: { href: string; to: string };
  /** Shown beside the back key, where the screen has no heading of its own below. */
  title?: ReactNode;
  help: HelpTopic;
  /** A comb is being read: every line of the screen counts. */
  reading?: boolean;
  press?: PressState;
  children: ReactNode;
}

function BackKey({ href, to }: { href: string; to: string }): ReactElement {
  return (
    <a
      href={href}
      aria-label={`Back to ${to}`}
      className="flex min-h-field min-w-field shrink-0 items-center justify-center rounded-xl text-4xl leading-none font-bold text-ink no-underline hover:bg-wash"
    >
      <span aria-hidden="true">‹</span>
    </a>
  );
}

function HomeMark(): ReactElement {
  return (
    <a href={FIELD_ROOT} className="flex min-h-field items-center gap-2 text-xl font-bold text-ink no-underline">
      <Mark size={38} />
      Undereave
    </a>
  );
}

/** The frame of every field screen: the way back, help and the corner that says where one's work is. */
export function FieldFrame({ back, title, help, reading = false, press, children }: FieldFrameProps): ReactElement {
  return (
    <div className="flex min-h-dvh flex-col bg-paper text-field text-ink">
      <header className="print-hidden sticky top-0 z-10 border-b-3 border-ink bg-paper">
        <div className="flex flex-wrap items-center gap-x-2 px-2">
          {back ? <BackKey {...back} /> : <HomeMark />}
          <div className="min-w-0 flex-1 leading-tight">{title}</div>
          <HelpKey topic={help} />
          <CornerStatus press={press} />
        </div>
      </header>
      <SignInAgain brief={reading} />
      {!reading && <ClockNotice />}
      {children}
    </div>
  );
}
