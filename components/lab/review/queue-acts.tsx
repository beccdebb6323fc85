'use client';

import { useRouter } from 'next/navigation';
import { type ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { buttonLook } from '@/components/ui/button-look';
import type { QueueRow } from './review-shapes';
import { useAct } from './use-act';

function Trouble({ words }: { words: string | null }): ReactElement {
  return (
    <span role="alert" className="block text-sm font-bold text-stop empty:hidden">
      {words}
    </span>
  );
}

/** Takes a second reading on and opens its bench. */
function ClaimKey({ visit, code }: { visit: string; code: string }): ReactElement {
  const router = useRouter();
  const { send, isSending, trouble } = useAct(`/api/visits/${visit}/claim`, {
    done: () => router.push(`/review/${visit}/read`),
  });
  return (
    <>
      <Button onClick={() => send({})} disabled={isSending} aria-label={`Read ${code} a second time`}>
        Read it
      </Button>
      <Trouble words={trouble} />
    </>
  );
}

/** Gives a second reading back to the queue. */
function ReleaseKey({ visit, code }: { visit: string; code: string }): ReactElement {
  const { send, isSending, trouble } = useAct(`/api/visits/${visit}/release`);
  return (
    <>
      <Button tone="quiet" onClick={() => send({})} disabled={isSending} aria-label={`Give ${code} back`}>
        Give back
      </Button>
      <Trouble words={trouble} />
    </>
  );
}

function OwnReading({ row }: { row: QueueRow }): ReactElement {
  return (
    <span className="flex flex-wrap items-center gap-2">
      <a
        href={`/review/${row.visit}/read`}
        className={buttonLook('main', 'lab')}
        aria-label={`Go on reading ${row.code}`}
      >
        Go on
      </a>
      <ReleaseKey visit={row.visit} code={row.code} />
    </span>
  );
}

/** What the person who looks can do about one visit of the queue. */
export function QueueActs({ row, frees }: { row: QueueRow; frees: boolean }): ReactElement | null {
  if (row.waitsFor === 'reading' && row.mine) return <OwnReading row={row} />;
  if (row.waitsFor === 'reading') return frees ? <ReleaseKey visit={row.visit} code={row.code} /> : null;
  if (row.waitsFor === 'second' && row.own) return <span className="text-quiet">you read it in the field</span>;
  if (row.waitsFor === 'second') return <ClaimKey visit={row.visit} code={row.code} />;
  return (
    <a
      href={`/review/${row.visit}`}
      className={buttonLook('plain', 'lab')}
      aria-label={`Compare the readings of ${row.code}`}
    >
      Compare
    </a>
  );
}
