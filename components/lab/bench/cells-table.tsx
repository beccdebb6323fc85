import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { momentWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { ringOf } from '@/lib/comb/axial';
import { isCellState, STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { MarkView } from '@/components/lab/lab-shapes';

interface CellsTableProps {
  marks: readonly MarkView[];
  zone: string;
  year: string;
}

function markWords({ nectar, unsure, reused, scrap, instar }: MarkView): string {
  const words = [
    nectar && 'nectar',
    unsure && 'unsure',
    reused && 'reused',
    scrap && 'prey scrap',
    instar !== null && `instar ${instar}`,
  ];
  return words.filter(Boolean).join(', ');
}

function StateCell({ state }: { state: string }): ReactElement {
  if (!isCellState(state)) return <>{state}</>;
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <CellGlyph state={state} size={22} />
      {STATE_WORDS[state]}
    </span>
  );
}

/** Every cell of a reading in walk order, in words: for reading through, and for those who do not see the comb. */
export function CellsTable({ marks, zone, year }: CellsTableProps): ReactElement {
  return (
    <Table scrolls caption="Cells in walk order" className="text-[0.9375rem]">
      <thead>
        <tr>
          <HeadCell className="text-right">Cell</HeadCell>
          <HeadCell className="text-right max-sm:hidden">Ring</HeadCell>
          <HeadCell>State</HeadCell>
          <HeadCell>Marks and note</HeadCell>
          <HeadCell className="max-sm:hidden">Marked</HeadCell>
        </tr>
      </thead>
      <tbody>
        {marks.map((mark) => (
          <tr key={cellNumber(mark)}>
            <BodyCell number>{cellNumber(mark)}</BodyCell>
            <BodyCell number className="max-sm:hidden">
              {ringOf(mark)}
            </BodyCell>
            <BodyCell>
              <StateCell state={mark.state} />
            </BodyCell>
            <BodyCell className="[overflow-wrap:anywhere]">
              {markWords(mark)}
              {mark.note !== null && <p className="whitespace-pre-line">{mark.note}</p>}
            </BodyCell>
            <BodyCell className="whitespace-nowrap max-sm:hidden">
              {mark.at === null ? 'by a reviewer' : momentWords(mark.at, zone, year)}
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
