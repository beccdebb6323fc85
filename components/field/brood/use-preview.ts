'use client';

import { useEffect, useState } from 'react';
import type { BroodEstimate } from '@/lib/brood/answer';
import type { Mark } from '@/lib/comb/mark';
import { askBrood } from '@/lib/offline/browser-brood';
import { NoEstimateError, type NoEstimateReason } from '@/lib/offline/brood-asker';
import type { BroodTask } from '@/lib/offline/brood-messages';
import type { BroodHistory } from '@/lib/offline/brood-history';
import { useBroodHistory } from '@/lib/offline/hooks/use-brood-history';
import { afterPaint } from './after-paint';

/** What is estimated from. */
export interface PreviewSource {
  nest: string;
  reading: string;
  taxon: string | null;
  marks: readonly Mark[];
  zone: string;
}

/** `none`: this phone gives no estimate; the reading itself is not touched by that. */
export type Preview =
  { kind: 'computing' } | { kind: 'none'; reason: NoEstimateReason } | { kind: 'ready'; estimate: BroodEstimate };

const COMPUTING: Preview = { kind: 'computing' };

/** The latest moment a mark was made, for a phone that cannot tell when the visit began. */
function readAt(marks: readonly Mark[]): number {
  return Math.max(...marks.map((mark) => Date.parse(mark.at)));
}

/** The question: this reading and those of earlier visits that are on the phone, as of the visit. */
function taskOf({ nest, reading, taxon, marks, zone }: PreviewSource, history: BroodHistory | null): BroodTask {
  const at = history?.visitAt ?? readAt(marks);
  const present = { id: reading, at, marks: [...marks] };
  return { nest, zone, taxon, asOf: at, readings: [...(history?.earlier ?? []), present] };
}

/** An estimate from what is on the phone, made beside the main thread so that nobody waits for it. */
export function usePreview(source: PreviewSource): Preview {
  const { nest, reading, taxon, marks, zone } = source;
  const history = useBroodHistory(nest, reading);
  const digest = marks.map((mark) => mark.opId).join();
  const question = `${reading} ${taxon} ${digest}`;
  const [found, setFound] = useState({ question: '', preview: COMPUTING });
  useEffect(() => {
    if (history === undefined || marks.length === 0) return;
    let current = true;
    const show = (preview: Preview): void => {
      if (current) setFound({ question, preview });
    };
    const ask = (): void =>
      void askBrood(taskOf({ nest, reading, taxon, marks, zone }, history)).then(
        (estimate) => show({ kind: 'ready', estimate }),
        (error: unknown) => show({ kind: 'none', reason: error instanceof NoEstimateError ? error.reason : 'model' }),
      );
    const withdraw = afterPaint(ask);
    return () => {
      current = false;
      withdraw();
    };
    // The marks are one list by value: `question` says when they change.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [question, history, zone]);
  return found.question === question ? found.preview : COMPUTING;
}
