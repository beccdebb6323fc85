'use client';

import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { postAct } from './post-act';

/** An act of the lab: sending it, and what failed. */
export interface ActHandle {
  send: (body: unknown) => void;
  isSending: boolean;
  /** What failed, in words; null when nothing did. */
  trouble: string | null;
}

/**
 * Sends an act and then shows the page fresh from the office, whether it was taken or not: when it was not, somebody
 * else has usually changed something.
 *
 * @param on `done` is called once the office has stored it, `refused` when it has not, with the reason in words: for
 * forms that are gone once the page is fresh.
 */
export function useAct(path: string, on: { done?: () => void; refused?: (words: string) => void } = {}): ActHandle {
  const router = useRouter();
  const mutation = useMutation({
    mutationFn: (body: unknown) => postAct(path, body, fetch),
    onSuccess: (result) => {
      if (result.ok) on.done?.();
      else on.refused?.(result.words);
      router.refresh();
    },
  });
  const { data } = mutation;
  return { send: mutation.mutate, isSending: mutation.isPending, trouble: data && !data.ok ? data.words : null };
}
