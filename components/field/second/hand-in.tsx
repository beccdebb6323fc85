'use client';

import { type ReactElement, useState } from 'react';
import { TallyLine } from '@/components/comb/tally-line';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import type { Recorder } from '@/lib/offline/recorder-view';

interface HandInProps {
  recorder: Recorder;
  open: boolean;
  onClose: () => void;
}

type HandingIn = 'ready' | 'saving' | 'failed';

/** Fewer cells marked than counted, in words; null when they are as many, or nobody counted. */
function missingWords({ view }: Recorder): string | null {
  const { expectedTotal, tally } = view;
  if (expectedTotal === null || expectedTotal === tally.cellsTotal) return null;
  return `You counted ${countWords(expectedTotal, 'cell')} and marked ${tally.cellsTotal}.`;
}

/** Asks once more, then hands the second reading in; from there on the first one can be seen. */
export function HandIn({ recorder, open, onClose }: HandInProps): ReactElement {
  const [state, setState] = useState<HandingIn>('ready');
  const missing = missingWords(recorder);
  const submit = async (): Promise<void> => {
    if (state === 'saving') return;
    setState('saving');
    try {
      await recorder.submit();
      onClose();
    } catch {
      setState('failed');
    }
  };
  return (
    <Dialog open={open} title="Hand in this reading?" onClose={onClose}>
      <TallyLine tally={recorder.view.tally} />
      {missing && <p className="mt-2 font-bold text-warn">{missing}</p>}
      <p className="mt-2">After this you can see the first reading, so yours is fixed as what you saw blind.</p>
      {state === 'failed' && (
        <Notice tone="stop" live="assertive" className="mt-3">
          <p>Not saved. Your marks are; try once more, and keep this page open until then.</p>
        </Notice>
      )}
      <div className="mt-5 flex flex-wrap gap-3">
        <Button
          tone="main"
          // The dialog opens by a key, so Enter goes on from there.
          autoFocus
          disabled={state === 'saving' || recorder.view.tally.cellsTotal === 0}
          onClick={() => void submit()}
        >
          {state === 'saving' ? 'Saving …' : 'Hand it in'}
        </Button>
        <Button onClick={onClose}>Back to the cells</Button>
      </div>
    </Dialog>
  );
}
