'use client';

import { useRouter } from 'next/navigation';
import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useKeep } from '@/components/lab/use-keep';

interface LearningActProps {
  /** What the key says. */
  label: string;
  /** What goes into the draft. */
  change: object;
}

/** Puts what was learnt into the draft; it counts once that is signed. */
export function LearningAct({ label, change }: LearningActProps): ReactElement {
  const router = useRouter();
  const { send, isSending, trouble } = useKeep(() => router.push('/settings/draft'));
  return (
    <div className="mt-3">
      <Button disabled={isSending} onClick={() => send({ method: 'PUT', path: '/api/settings/draft', body: change })}>
        {isSending ? 'Putting it there …' : label}
      </Button>
      {trouble && (
        <Notice tone="stop" live="assertive" className="mt-2">
          <p>{trouble}</p>
        </Notice>
      )}
    </div>
  );
}
