import { useState } from 'react';
import { askOffice } from '@/components/lab/ask-office';
import type { ImpactPart, NestShiftView } from './settings-shapes';

/** How far the looking has come. */
export interface Impact {
  state: 'not-asked' | 'looking' | 'done' | 'failed';
  looked: number;
  total: number;
  nests: readonly NestShiftView[];
  /** What failed, in words. */
  trouble: string | null;
  look: () => void;
}

const NOTHING: Omit<Impact, 'look'> = { state: 'not-asked', looked: 0, total: 0, nests: [], trouble: null };

/** Asks the office part by part how far each nest's dates would move, and shows every part as it comes. */
export function useImpact(): Impact {
  const [impact, setImpact] = useState(NOTHING);
  const look = async (): Promise<void> => {
    let sum: Omit<Impact, 'look'> = { ...NOTHING, state: 'looking' };
    let after: string | null = null;
    setImpact(sum);
    do {
      const query: string = after === null ? '' : `?after=${after}`;
      const result = await askOffice({ method: 'GET', path: `/api/settings/draft/impact${query}` }, fetch);
      if (!result.ok) return setImpact({ ...sum, state: 'failed', trouble: result.words });
      // The office answers in the shape of its own parts.
      const part = result.answer as ImpactPart;
      const { looked, nests } = sum;
      sum = { ...sum, total: part.total, looked: looked + part.looked, nests: [...nests, ...part.nests] };
      after = part.next;
      setImpact(after === null ? { ...sum, state: 'done' } : sum);
    } while (after !== null);
  };
  return { ...impact, look: () => void look() };
}
