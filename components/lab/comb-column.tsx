import type { ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { tallyWords } from '@/components/comb/comb-view';
import { TallyLine } from '@/components/comb/tally-line';
import { countWords, momentWords } from '@/components/ui/date-words';
import type { CellEstimate } from '@/lib/brood/answer';
import { cellLines } from './cell-lines';
import { cellSizeFor } from './cell-size';
import { CombInspector } from './comb-inspector';
import type { ReadingView, SettlementView } from './lab-shapes';
import { kindWords } from './lab-words';
import { readingCells } from './reading-cells';

/** Room for the comb at full width of the page, in CSS pixels. */
const COLUMN_PX = 448;

interface CombColumnProps {
  code: string;
  reading: ReadingView;
  /** When the visit of the reading began. */
  visitAt: string;
  settlements: readonly SettlementView[];
  estimates: readonly CellEstimate[];
  zone: string;
  year: string;
}

/** The comb of one reading, from below, with its tally in words and the key to its symbols. */
export function CombColumn({
  code,
  reading,
  visitAt,
  settlements,
  estimates,
  zone,
  year,
}: CombColumnProps): ReactElement {
  const cells = readingCells(reading.marks, settlements);
  const total = countWords(cells.length, 'cell');
  return (
    <>
      <p className="mb-2">
        <span className="font-bold">{momentWords(visitAt, zone, year)}</span>
        <span className="text-quiet">
          , {kindWords(reading.kind)} by {reading.observer}
        </span>
      </p>
      {cells.length === 0 ? (
        <p className="py-6 text-quiet">No cell is marked in this reading yet.</p>
      ) : (
        <CombInspector
          cells={cells}
          label={`Comb of ${code}, ${total}: ${tallyWords(reading.tally).join(', ')}`}
          cellSize={cellSizeFor(cells, COLUMN_PX)}
          lines={cellLines(reading.marks, estimates, year)}
          tells="its dates"
        />
      )}
      <TallyLine tally={reading.tally} className="mt-4" />
      <CombKey cells={cells} className="mt-4 border-t border-rule pt-3" />
    </>
  );
}
