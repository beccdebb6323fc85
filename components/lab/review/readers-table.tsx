import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { ReaderRow } from './review-shapes';

/** Who of the lab has what in hand, and has done what. */
export function ReadersTable({ readers }: { readers: readonly ReaderRow[] }): ReactElement {
  return (
    <Table caption="People of the lab" className="max-w-2xl">
      <thead>
        <tr>
          <HeadCell>Person</HeadCell>
          <HeadCell className="text-right">Reading now</HeadCell>
          <HeadCell className="text-right">Read a second time</HeadCell>
          <HeadCell className="text-right">Versions locked</HeadCell>
        </tr>
      </thead>
      <tbody>
        {readers.map(({ name, reading, read, locked }) => (
          <tr key={name}>
            <BodyCell>{name}</BodyCell>
            <BodyCell number>{reading}</BodyCell>
            <BodyCell number>{read}</BodyCell>
            <BodyCell number>{locked}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
