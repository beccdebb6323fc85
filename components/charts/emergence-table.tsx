import type { ReactElement } from 'react';
import { dateWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { EmergenceDay } from './emergence-day';

interface EmergenceTableProps {
  days: readonly EmergenceDay[];
  inYear: string;
}

/** Adults expected per day in numbers: the same days as the chart. */
export function EmergenceTable({ days, inYear }: EmergenceTableProps): ReactElement {
  return (
    <Table scrolls caption="Adults expected per day; each range holds 8 times in 10" className="text-sm sm:max-w-md">
      <thead>
        <tr>
          <HeadCell>Day</HeadCell>
          <HeadCell className="text-right">Expected</HeadCell>
          <HeadCell className="text-right">From</HeadCell>
          <HeadCell className="text-right">To</HeadCell>
        </tr>
      </thead>
      <tbody>
        {days.map(({ date, expected, lo80, hi80 }) => (
          <tr key={date}>
            <BodyCell>{dateWords(date, inYear)}</BodyCell>
            <BodyCell number>{expected.toFixed(2)}</BodyCell>
            <BodyCell number>{lo80}</BodyCell>
            <BodyCell number>{hi80}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
