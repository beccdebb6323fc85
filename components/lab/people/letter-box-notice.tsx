import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import type { LetterBoxView } from './people-shapes';

/** Where letters go, when it is not the mail. */
export function LetterBoxNotice({ box }: { box: LetterBoxView }): ReactElement | null {
  if (box === 'mail') return null;
  if (box === 'none') {
    return (
      <Notice tone="warn" title="This server sends no letters" className="mb-5">
        <p>Whoever runs it has to name a mail server (MAIL_URL). Until then nobody can be invited or choose anew.</p>
      </Notice>
    );
  }
  return (
    <Notice className="mb-5">
      <p>
        This is a demo: letters are not sent.{' '}
        <a href="/letters" className="underline">
          Read them here
        </a>
        .
      </p>
    </Notice>
  );
}
