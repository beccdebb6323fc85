import type { ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { CombPicture } from '@/components/comb/comb-picture';
import { type CombCellView, tallyWords } from '@/components/comb/comb-view';
import { PairPicture } from '@/components/comb/pair-picture';
import { cellSizeFor } from '@/components/lab/cell-size';
import { countWords } from '@/components/ui/date-words';
import type { MarkContent } from '@/lib/comb/mark';
import { tallyOf } from '@/lib/comb/tally';
import type { ComparedView, PairRow } from './review-shapes';

interface CompareCombsProps {
  code: string;
  compared: ComparedView;
}

/** Room for one of two combs beside each other, and for the one laid over both, in CSS pixels. */
const HALF_PX = 420;
const WHOLE_PX = 640;

function cellsOf(marks: readonly MarkContent[]): CombCellView[] {
  return marks.map(({ note, ...cell }) => ({ ...cell, noted: note !== null }));
}

function isDifferent({ standing }: PairRow): boolean {
  return standing !== 'alike';
}

interface SideProps {
  title: string;
  code: string;
  marks: readonly MarkContent[];
  pairs: readonly PairRow[];
}

/** One reader's comb, with what the other saw differently outlined twice. */
function Side({ title, code, marks, pairs }: SideProps): ReactElement {
  const cells = cellsOf(marks);
  const tally = tallyWords(tallyOf(marks)).join(', ');
  return (
    <figure className="min-w-0">
      <figcaption className="mb-1 font-bold">{title}</figcaption>
      <div className="overflow-x-auto print:overflow-visible" role="group" aria-label={title} tabIndex={0}>
        <CombPicture
          cells={cells}
          label={`Comb of ${code}, ${countWords(cells.length, 'cell')}: ${tally}`}
          cellSize={cellSizeFor(cells, HALF_PX)}
          differs={pairs.filter(isDifferent).filter(({ q, r }) => cells.some((cell) => cell.q === q && cell.r === r))}
        />
      </div>
      <p className="mt-1 text-sm text-quiet">{tally}</p>
    </figure>
  );
}

/** Both combs beside each other, and below them one laid over the other. */
export function CompareCombs({ code, compared }: CompareCombsProps): ReactElement {
  const { field, lab, pairs } = compared;
  const laid = pairs.map((pair) => ({
    q: pair.q,
    r: pair.r,
    field: pair.field?.state ?? null,
    lab: pair.lab?.state ?? null,
  }));
  const different = pairs.filter(isDifferent).length;
  return (
    <>
      <div className="grid gap-6 md:grid-cols-2">
        <Side title="Field reading" code={code} marks={field} pairs={pairs} />
        <Side title="Second reading, blind" code={code} marks={lab} pairs={pairs} />
      </div>
      <figure className="keep-together mt-6 min-w-0">
        <figcaption className="mb-1 font-bold">One over the other: field left, lab right</figcaption>
        <div
          className="overflow-x-auto print:overflow-visible"
          role="group"
          aria-label="One over the other"
          tabIndex={0}
        >
          <PairPicture
            pairs={laid}
            label={`Both readings of ${code}: ${countWords(different, 'cell')} of ${laid.length} not read alike`}
            cellSize={cellSizeFor(laid, WHOLE_PX)}
          />
        </div>
      </figure>
      <CombKey cells={[...cellsOf(field), ...cellsOf(lab)]} className="mt-3 border-t border-rule pt-3" />
    </>
  );
}
