import Link from 'next/link';
import type { ReactElement } from 'react';
import { NestCode } from '@/components/lab/nest-code';
import { purposeWords } from '@/components/lab/lab-words';
import { countWords, dayWords, momentWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { QueueActs } from './queue-acts';
import type { QueueRow } from './review-shapes';
import { WAITS_WORDS } from './review-words';

interface QueueTableProps {
  rows: readonly QueueRow[];
  zone: string;
  year: string;
  /** May the person give back what somebody else has taken on? */
  frees: boolean;
}

function Waiting({ row, zone, year }: { row: QueueRow; zone: string; year: string }): ReactElement {
  return (
    <>
      <p>{WAITS_WORDS[row.waitsFor]}</p>
      {row.waitsFor === 'reading' && row.reader && (
        <p className="text-sm text-quiet">{row.mine ? 'you' : row.reader}</p>
      )}
      {row.toChoose > 0 && (
        <p className="text-sm text-warn">
          {countWords(row.toChoose, 'field reading')}:{' '}
          <Link href={`/review/${row.visit}`} className="underline">
            none is chosen yet
          </Link>
        </p>
      )}
      <p className="text-sm text-quiet sm:hidden">handed in {dayWords(row.submittedAt, zone, year)}</p>
      {row.overdue && <p className="text-sm font-bold text-stop">overdue</p>}
    </>
  );
}

/** What waits in the lab, oldest first. It shows no number of any reading. */
export function QueueTable({ rows, zone, year, frees }: QueueTableProps): ReactElement {
  return (
    <Table caption="What waits in the lab, oldest first">
      <thead>
        <tr>
          <HeadCell>Nest</HeadCell>
          <HeadCell className="max-md:hidden">Visit</HeadCell>
          <HeadCell className="max-sm:hidden">Handed in</HeadCell>
          <HeadCell>Waits for</HeadCell>
          <HeadCell>
            <span className="sr-only">What you can do</span>
          </HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.visit}>
            <BodyCell>
              <NestCode>{row.code}</NestCode>
              {row.name && <p className="text-sm text-quiet">{row.name}</p>}
            </BodyCell>
            <BodyCell className="max-md:hidden">
              {purposeWords(row.purpose)}, {momentWords(row.startedAt, zone, year)}
            </BodyCell>
            <BodyCell className="whitespace-nowrap max-sm:hidden">{momentWords(row.submittedAt, zone, year)}</BodyCell>
            <BodyCell>
              <Waiting row={row} zone={zone} year={year} />
            </BodyCell>
            <BodyCell>
              <QueueActs row={row} frees={frees} />
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
