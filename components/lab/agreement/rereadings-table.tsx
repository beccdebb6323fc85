import Link from 'next/link';
import type { ReactElement } from 'react';
import { dateWords } from '@/components/ui/date-words';
import { monthWords } from '@/components/ui/month-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { NestCode } from '@/components/lab/nest-code';
import type { RereadingView } from './agreement-shapes';

function byWhom({ purpose, reader }: RereadingView): string {
  return purpose === 'same-reader' ? `${reader} again` : `anybody but ${reader}`;
}

/** The readings drawn to be read again, and how far they are. */
export function RereadingsTable({ drawn }: { drawn: readonly RereadingView[] }): ReactElement {
  return (
    <Table caption="Readings drawn to be read again">
      <thead>
        <tr>
          <HeadCell>Nest</HeadCell>
          <HeadCell>To be read by</HeadCell>
          <HeadCell>Standing</HeadCell>
          <HeadCell className="max-sm:hidden">Drawn for</HeadCell>
        </tr>
      </thead>
      <tbody>
        {drawn.map((sample) => (
          <tr key={sample.id}>
            <BodyCell className="whitespace-nowrap">
              <Link
                href={`/nests/${sample.nest.id}`}
                className="inline-flex min-h-8 items-center text-main underline underline-offset-4"
              >
                <NestCode>{sample.nest.code}</NestCode>
              </Link>{' '}
              <span className="text-sm text-quiet">visit of {dateWords(sample.visitDate)}</span>
            </BodyCell>
            <BodyCell>{byWhom(sample)}</BodyCell>
            <BodyCell className={sample.standing === 'waiting' ? 'text-warn' : ''}>{sample.standing}</BodyCell>
            <BodyCell className="max-sm:hidden">
              {monthWords(sample.month)} <span className="font-mono text-sm text-quiet">seed {sample.seed}</span>
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
