import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { Correction } from './correction';

interface CorrectionListProps {
  corrections: readonly Correction[];
  isSending: boolean;
  onRemove: (correction: Correction) => void;
  onSave: () => void;
}

/** The decisions waiting to be stored, each with its way out. */
export function CorrectionList({ corrections, isSending, onRemove, onSave }: CorrectionListProps): ReactElement {
  if (corrections.length === 0)
    return <p className="text-quiet">Nothing in the list yet. The observer’s marks are never changed.</p>;
  return (
    <>
      <ol className="flex flex-col">
        {corrections.map((correction) => (
          <li key={cellNumber(correction)} className="flex items-start gap-2 border-b border-rule py-2">
            <CellGlyph state={correction.state} size={26} />
            <div className="min-w-0 grow [overflow-wrap:anywhere]">
              <p className="font-bold">
                Cell {cellNumber(correction)}: {STATE_WORDS[correction.was]} → {STATE_WORDS[correction.state]}
              </p>
              <p className="whitespace-pre-line">{correction.reason}</p>
            </div>
            <Button tone="quiet" disabled={isSending} onClick={() => onRemove(correction)}>
              Take out<span className="sr-only"> cell {cellNumber(correction)}</span>
            </Button>
          </li>
        ))}
      </ol>
      <Button tone="main" className="mt-3" disabled={isSending} onClick={onSave}>
        {isSending ? 'Storing …' : `Settle ${countWords(corrections.length, 'cell')}`}
      </Button>
    </>
  );
}
