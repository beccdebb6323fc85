import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { stringMember } from './string-member';

interface FailureProps {
  /** What was thrown; faults on the server carry a number (`digest`) that also stands in its log. */
  error: unknown;
  onRetry: () => void;
}

/** What a page says when it could not be made: what is known, what is not lost, what to do. */
export function Failure({ error, onRetry }: FailureProps): ReactElement {
  const digest = stringMember(error, 'digest');
  return (
    <div className="max-w-text">
      <h1 className="text-2xl font-bold">This page could not be made</h1>
      <Notice tone="stop" live="assertive" className="mt-4">
        <p>Something failed on our side, or the office cannot be reached. Nothing that was stored is lost.</p>
        {digest && (
          <p className="mt-1">
            When you ask for help, name this number: <span className="font-mono">{digest}</span>
          </p>
        )}
      </Notice>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button tone="main" onClick={onRetry}>
          Try again
        </Button>
        <LinkButton href="/">To the start</LinkButton>
      </div>
    </div>
  );
}
