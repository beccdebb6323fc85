import { useState } from 'react';
import { type OfficeAct, type OfficeAnswer, askToAct } from './office-request';

interface ActHandle {
  /** Sends the act; resolves with what came of it. */
  send: (act: OfficeAct) => Promise<OfficeAnswer>;
  isSending: boolean;
  /** What failed last, in words; null when nothing did. */
  trouble: string | null;
  setTrouble: (words: string | null) => void;
}

/** One act at a time at the office, with what went wrong. */
export function useAct(): ActHandle {
  const [isSending, setSending] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  const send = async (act: OfficeAct): Promise<OfficeAnswer> => {
    setSending(true);
    setTrouble(null);
    const result = await askToAct(act, fetch);
    if (!result.ok) setTrouble(result.words);
    setSending(false);
    return result;
  };
  return { send, isSending, trouble, setTrouble };
}
