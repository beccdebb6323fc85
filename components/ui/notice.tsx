import type { ReactElement, ReactNode } from 'react';

/** How much a notice matters: good to know, take care, or stop. */
export type NoticeTone = 'info' | 'warn' | 'stop';

interface NoticeProps {
  tone?: NoticeTone;
  title?: string;
  /** Read out when it appears: politely for news, at once for what failed. */
  live?: 'polite' | 'assertive';
  className?: string;
  children?: ReactNode;
}

const LOOKS: Readonly<Record<NoticeTone, string>> = {
  info: 'border-main bg-main-wash',
  warn: 'border-warn bg-warn-wash',
  stop: 'border-stop bg-stop-wash',
};

const LIVE_ROLES = { polite: 'status', assertive: 'alert' } as const;

const MARKS: Readonly<Record<NoticeTone, { sign: string; word: string; look: string }>> = {
  info: { sign: 'i', word: 'Note: ', look: 'text-main' },
  warn: { sign: '!', word: 'Take care: ', look: 'text-warn' },
  stop: { sign: '×', word: 'Stop: ', look: 'text-stop' },
};

/** A short message in its own box. The tone is said in words too, never by colour alone. */
export function Notice({ tone = 'info', title, live, className = '', children }: NoticeProps): ReactElement {
  const { sign, word, look } = MARKS[tone];
  return (
    <div
      role={live && LIVE_ROLES[live]}
      className={`keep-together flex gap-3 rounded-r border-l-[6px] px-4 py-3 ${LOOKS[tone]} ${className}`}
    >
      <span aria-hidden="true" className={`font-mono text-lg leading-6 font-bold ${look}`}>
        {sign}
      </span>
      <div className="min-w-0 [overflow-wrap:anywhere]">
        <span className="sr-only">{word}</span>
        {title && <p className="font-bold">{title}</p>}
        {children}
      </div>
    </div>
  );
}
