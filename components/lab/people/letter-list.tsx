import type { ReactElement } from 'react';
import { momentWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import type { TimeView } from './people-shapes';

/** A letter, as the page is given it. */
export interface LetterView {
  id: string;
  kind: string;
  recipient: string;
  writtenAt: string;
  sent: boolean;
  words: { subject: string; text: string } | null;
}

const KINDS: Readonly<Record<string, string>> = {
  invitation: 'Invitation',
  reset: 'Link to a new password',
  'password-changed': 'Notice of a new password',
};

/** Web addresses of this product in a letter's text, made pressable. */
function withLinks(text: string): ReactElement[] {
  return text.split(/(https?:\/\/\S+)/).map((part, index) =>
    /^https?:/.test(part) ? (
      <a key={index} href={part} className="text-main underline [overflow-wrap:anywhere]">
        {part}
      </a>
    ) : (
      <span key={index}>{part}</span>
    ),
  );
}

/** Letters, newest first; in the demo with their words. */
export function LetterList({ letters, zone, today }: { letters: readonly LetterView[] } & TimeView): ReactElement {
  return (
    <ul className="flex flex-col">
      {letters.map(({ id, kind, recipient, writtenAt, sent, words }) => (
        <li key={id} className="border-b border-rule py-3">
          <p className="[overflow-wrap:anywhere]">
            <span className="font-bold">{KINDS[kind] ?? kind}</span> to {recipient}
            <span className="text-quiet">, {momentWords(writtenAt, zone, today)}</span>
            {!sent && <span className="font-bold text-stop">, not sent</span>}
          </p>
          {words && (
            <Disclosure summary={words.subject}>
              <p className="max-w-text [overflow-wrap:anywhere] whitespace-pre-line">{withLinks(words.text)}</p>
            </Disclosure>
          )}
        </li>
      ))}
    </ul>
  );
}
