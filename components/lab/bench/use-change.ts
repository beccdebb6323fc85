import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { type Change, type ChangeResult, requestChange } from './change-request';

interface ChangeHandle {
  send: (change: Omit<Change, 'reading'>) => void;
  isSending: boolean;
  /** What failed, in words; null when nothing did. */
  trouble: string | null;
}

interface ChangeOptions {
  nest: string;
  reading: string;
  /** Called once the office has stored the change. */
  onStored: () => void;
}

/** Sends a change of a reading and shows the final reading afterwards, fresh from the office. */
export function useChange({ nest, reading, onStored }: ChangeOptions): ChangeHandle {
  const router = useRouter();
  const follow = (result: ChangeResult): void => {
    if (!result.ok) return;
    onStored();
    if (result.reading !== reading) router.push(`/nests/${nest}/readings/${result.reading}`);
    router.refresh();
  };
  const mutation = useMutation({
    mutationFn: (change: Omit<Change, 'reading'>) => requestChange({ ...change, reading }, fetch),
    onSuccess: follow,
  });
  const { data } = mutation;
  return { send: mutation.mutate, isSending: mutation.isPending, trouble: data && !data.ok ? data.words : null };
}
