import type { ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { CombPicture } from '@/components/comb/comb-picture';
import { TallyLine } from '@/components/comb/tally-line';
import { tallyWords } from '@/components/comb/comb-view';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import type { ReadingView } from '@/lib/offline/nest-view';
import { cellsOfMarks } from './comb-cells';

/** A reading to look at: the comb and its tally. What a second reader may not see yet stays hidden. */
export function ReadingMap({ reading }: { reading: ReadingView }): ReactElement {
  if (reading.blind) {
    return (
      <Notice title="Hidden for now">
        <p>You are making a second reading of this visit. Hand yours in; then you can see this one.</p>
      </Notice>
    );
  }
  if (reading.marks.length === 0) return <p>No cell has a mark yet.</p>;
  const cells = cellsOfMarks(reading.marks);
  const words = [countWords(reading.tally.cellsTotal, 'cell'), ...tallyWords(reading.tally)].join(', ');
  return (
    <div className="flex flex-col gap-3 [&_.comb-label]:text-field">
      <CombPicture cells={cells} label={`Comb: ${words}`} cellSize={46} />
      <TallyLine tally={reading.tally} />
      <CombKey cells={cells} className="print-only" />
    </div>
  );
}
