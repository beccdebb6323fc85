import { useRouter } from 'next/navigation';
import type { OfficeAct, OfficeAnswer } from '@/components/shell/office-request';
import { useAct } from '@/components/shell/use-act';

interface PageActHandle {
  send: (act: OfficeAct) => Promise<OfficeAnswer>;
  isSending: boolean;
  trouble: string | null;
  setTrouble: (words: string | null) => void;
}

/** An act after which the page shows what the office has now. */
export function usePageAct(): PageActHandle {
  const router = useRouter();
  const { send, ...rest } = useAct();
  return {
    ...rest,
    send: async (act) => {
      const result = await send(act);
      if (result.ok) router.refresh();
      return result;
    },
  };
}
