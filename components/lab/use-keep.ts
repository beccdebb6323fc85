import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { type OfficeRequest, type OfficeResult, askOffice } from '@/components/lab/ask-office';

/** A change at the office that the page shows afterwards. */
export interface Keeping {
  send: (request: OfficeRequest) => void;
  isSending: boolean;
  /** What failed, in words; null when nothing did. */
  trouble: string | null;
}

/** Sends a change and shows the page anew once the office has stored it. */
export function useKeep(onStored: (result: OfficeResult) => void = () => undefined): Keeping {
  const router = useRouter();
  const { mutate, isPending, data } = useMutation({
    mutationFn: (request: OfficeRequest) => askOffice(request, fetch),
    onSuccess: (result) => {
      if (!result.ok) return;
      onStored(result);
      router.refresh();
    },
  });
  return { send: mutate, isSending: isPending, trouble: data && !data.ok ? data.words : null };
}
