'use client';

import type { ReactElement } from 'react';
import { TallyLine } from '@/components/comb/tally-line';
import { sentence } from '@/components/ui/sentence';
import { useSyncStatus } from '@/lib/offline/hooks/use-sync-status';
import { cellNumber } from '@/lib/comb/walk';
import type { RecorderView } from '@/lib/offline/recorder-view';
import type { Bench } from './use-bench';

function pressWords({ unsaved, pending }: RecorderView): string | null {
  if (unsaved.length > 0) return 'not saved';
  return pending > 0 ? 'saving' : null;
}

/** Which cell the next letter is about, what the last one did, and where the work is. */
export function BenchHead({ bench }: { bench: Bench }): ReactElement {
  const { view } = bench.recorder;
  const { words } = useSyncStatus();
  const here = view.current ? `Cell ${cellNumber(view.current)}` : 'Walk over';
  const last = bench.memory.words ?? view.lastWords;
  return (
    <div className="border-l-[6px] border-main bg-main-wash px-3 py-2">
      <div className="flex items-baseline justify-between gap-3">
        <p className="text-2xl font-bold">{here}</p>
        <p className="text-right text-sm">{sentence(pressWords(view) ?? words)}</p>
      </div>
      <p role="status" aria-label="Last mark" className="min-h-6">
        {last ?? 'Nothing is marked yet.'}
      </p>
      <TallyLine tally={view.tally} className="mt-1 min-h-6 text-[0.9375rem]" />
    </div>
  );
}
