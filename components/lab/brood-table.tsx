import type { ReactElement } from 'react';
import { DateRangeWords } from '@/components/ui/date-range';
import { runWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { STATE_WORDS } from '@/lib/comb/states';
import type { BroodRow } from './brood-rows';

interface BroodTableProps {
  rows: readonly BroodRow[];
  inYear: string;
}

/** The brood chart in words: the same strips, every date with its range. */
export function BroodTable({ rows, inYear }: BroodTableProps): ReactElement {
  return (
    <Table scrolls caption="Brood dates, oldest first; each range holds 8 times in 10" className="text-sm">
      <thead>
        <tr>
          <HeadCell>Cells</HeadCell>
          <HeadCell>Seen as</HeadCell>
          <HeadCell>Laid</HeadCell>
          <HeadCell>Capped</HeadCell>
          <HeadCell>Adult comes out</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ cells, state, laid, capped, emerges }) => (
          <tr key={cells.join()}>
            <BodyCell className="font-mono">{runWords(cells)}</BodyCell>
            <BodyCell>{STATE_WORDS[state]}</BodyCell>
            <BodyCell>
              <DateRangeWords median={laid.median} ends={laid.p80} inYear={inYear} />
            </BodyCell>
            <BodyCell>
              {capped ? <DateRangeWords median={capped.median} ends={capped.p80} inYear={inYear} /> : 'not known'}
            </BodyCell>
            <BodyCell>
              {emerges ? <DateRangeWords median={emerges.median} ends={emerges.p80} inYear={inYear} /> : 'not known'}
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
