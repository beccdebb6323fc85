import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { CELL_STATES, STATE_LETTERS } from '@/lib/comb/states';
import { CorrectionForm } from './correction-form';
import { CorrectionList } from './correction-list';
import { type Desk, isAt } from './use-desk';

interface SettleSectionProps {
  desk: Desk;
  isSending: boolean;
  /** What failed at the office, in words. */
  trouble: string | null;
  onSave: () => void;
}

/** The letters of the states, as on the paper sheet: `- empty, o egg, …`. */
const LETTERS = CELL_STATES.map((state) => `${STATE_LETTERS[state]} ${state}`).join(', ');

/** The picked cell and the list of what waits to be stored. */
export function SettleSection({ desk, isSending, trouble, onSave }: SettleSectionProps): ReactElement {
  const { draft, corrections, choose, explain, add, remove } = desk;
  return (
    <>
      <Section id="settle" title="Settle a cell">
        {draft ? (
          <CorrectionForm
            draft={draft}
            isListed={corrections.some(isAt(draft.cell))}
            choose={choose}
            explain={explain}
            add={add}
          />
        ) : (
          <p className="text-quiet">
            Press a cell, or reach it with Tab and the arrow keys. A letter then chooses its state: {LETTERS}.
          </p>
        )}
      </Section>
      <Section id="list" title="To be settled">
        {trouble && (
          <Notice tone="stop" live="assertive" className="mb-3">
            <p>{trouble}</p>
          </Notice>
        )}
        <CorrectionList corrections={corrections} isSending={isSending} onRemove={remove} onSave={onSave} />
      </Section>
    </>
  );
}
