import type { ReactElement } from 'react';
import { countWords, runWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import type { Axial } from '@/lib/comb/axial';
import { cellNumber } from '@/lib/comb/walk';
import type { RecorderView } from '@/lib/offline/recorder-view';
import { finishCheck } from './finish-check';

interface FinishChecksProps {
  view: RecorderView;
  onGoTo: (cell: Axial) => void;
}

interface OpenCellsProps {
  words: string;
  cells: readonly Axial[];
  onGoTo: (cell: Axial) => void;
}

function OpenCells({ words, cells, onGoTo }: OpenCellsProps): ReactElement | null {
  const [first] = cells;
  if (!first) return null;
  return (
    <Notice tone="warn" title={words}>
      <p>{`${cells.length === 1 ? 'Cell' : 'Cells'} ${runWords(cells.map(cellNumber))}.`}</p>
      <FieldButton className="mt-2" onClick={() => onGoTo(first)}>
        Go to cell {cellNumber(first)}
      </FieldButton>
    </Notice>
  );
}

/** How the number of marks stands to the number counted. */
function countSentence(missing: number, counted: number | null): string | null {
  if (counted === null || missing === 0) return null;
  if (missing > 0) return `You counted ${countWords(counted, 'cell')}; ${missing} of them bear no mark.`;
  return `You counted ${countWords(counted, 'cell')} and marked ${-missing} more.`;
}

/** What is still open in a reading that is about to be handed in. All of it may stay open. */
export function FinishChecks({ view, onGoTo }: FinishChecksProps): ReactElement {
  const { unread, passed, missing } = finishCheck(view);
  const count = countSentence(missing, view.expectedTotal);
  return (
    <>
      {count && (
        <Notice tone="warn" title="The count differs">
          <p>{count}</p>
        </Notice>
      )}
      <OpenCells words={`${countWords(unread.length, 'cell')} unread`} cells={unread} onGoTo={onGoTo} />
      <OpenCells words={`${countWords(passed.length, 'place')} passed without a mark`} cells={passed} onGoTo={onGoTo} />
    </>
  );
}
