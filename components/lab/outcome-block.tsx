import type { ReactElement } from 'react';
import { fullDateWords } from '@/components/ui/date-words';

/** How the work on a nest ended. */
export interface OutcomeView {
  outcome: string;
  /** `YYYY-MM-DD`. */
  decidedOn: string;
  note: string | null;
}

/** The outcome of a nest, a failure said like any other. */
export function OutcomeBlock({ outcome: { outcome, decidedOn, note } }: { outcome: OutcomeView }): ReactElement {
  return (
    <>
      <p>
        <strong>{outcome}</strong>, {fullDateWords(decidedOn)}
      </p>
      {note && <p className="[overflow-wrap:anywhere] whitespace-pre-line">{note}</p>}
    </>
  );
}
