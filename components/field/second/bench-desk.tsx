'use client';

import { type ReactElement, useState } from 'react';
import { NotSavedAlert } from '@/components/field/recorder/not-saved-alert';
import type { Recorder } from '@/lib/offline/recorder-view';
import { BenchComb } from './bench-comb';
import { BenchHead } from './bench-head';
import { BenchPad } from './bench-pad';
import { HandIn } from './hand-in';
import { useBench } from './use-bench';

interface BenchDeskProps {
  recorder: Recorder;
  title: string;
}

/** The bench of a blind reading: the comb at the left, the keys at the right; on a tablet one above the other. */
export function BenchDesk({ recorder, title }: BenchDeskProps): ReactElement {
  const [finishing, setFinishing] = useState(false);
  const bench = useBench(recorder, () => setFinishing(true));
  return (
    <div className="grid gap-4 lg:grid-cols-[minmax(0,1fr)_25rem]">
      <div className="min-w-0">
        <BenchComb bench={bench} title={title} />
      </div>
      <div className="flex min-w-0 flex-col gap-3">
        <NotSavedAlert recorder={recorder} />
        <BenchHead bench={bench} />
        <BenchPad bench={bench} />
      </div>
      <HandIn recorder={recorder} open={finishing} onClose={() => setFinishing(false)} />
    </div>
  );
}
