import Link from 'next/link';
import type { ReactElement } from 'react';
import { dayWords } from '@/components/ui/date-words';
import { SortHead, type SortState } from '@/components/ui/sort-head';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { NestRow } from './lab-shapes';
import { addressWith, type ListQuery, nextSort, type SortColumn } from './list-query';
import { NestCode } from './nest-code';
import { StateWord } from './state-word';
import { TaxonName } from './taxon-name';

interface NestsTableProps {
  nests: readonly NestRow[];
  query: ListQuery;
  zone: string;
  /** The reader's year; dates of other years say theirs. */
  year: string;
}

/** Columns of the list; on a narrow page some step back and their words join the name. */
const COLUMNS: readonly { column: SortColumn; title: string; look?: string }[] = [
  { column: 'code', title: 'Nest' },
  { column: 'taxon', title: 'Species', look: 'hidden md:table-cell' },
  { column: 'openedAt', title: 'First opened', look: 'hidden lg:table-cell' },
  { column: 'visits', title: 'Visits', look: 'hidden sm:table-cell text-right' },
  { column: 'lastVisitAt', title: 'Last visit' },
  { column: 'cells', title: 'Cells', look: 'text-right' },
];

function sortState(sort: string | undefined, column: SortColumn): SortState {
  if (sort === column) return 'up';
  return sort === `-${column}` ? 'down' : 'none';
}

function NestCells({ nest, zone, year }: { nest: NestRow; zone: string; year: string }): ReactElement {
  return (
    <tr className="hover:bg-wash">
      <BodyCell>
        <Link href={`/nests/${nest.id}`} className="group inline-flex min-h-6 flex-wrap items-baseline gap-x-2 gap-y-1">
          <NestCode>{nest.code}</NestCode>
          <span className="underline decoration-edge underline-offset-4 group-hover:decoration-ink">
            {nest.name ?? 'no name'}
          </span>
        </Link>
        <p className="mt-1 text-sm md:hidden">
          <TaxonName>{nest.taxon}</TaxonName>
        </p>
        <p className="mt-1 text-sm sm:hidden">
          <StateWord state={nest.state} />
        </p>
      </BodyCell>
      <BodyCell className="hidden md:table-cell">
        <TaxonName>{nest.taxon}</TaxonName>
      </BodyCell>
      <BodyCell className="hidden whitespace-nowrap lg:table-cell">{dayWords(nest.openedAt, zone, year)}</BodyCell>
      <BodyCell number className="hidden sm:table-cell">
        {nest.visits}
      </BodyCell>
      <BodyCell className="whitespace-nowrap">
        {nest.lastVisitAt ? dayWords(nest.lastVisitAt, zone, year) : 'none yet'}
      </BodyCell>
      <BodyCell number>{nest.cells ?? <span className="text-quiet">none</span>}</BodyCell>
      <BodyCell className="hidden whitespace-nowrap sm:table-cell">
        <StateWord state={nest.state} />
      </BodyCell>
    </tr>
  );
}

/** The nests of a team, one a row, sortable by every column. */
export function NestsTable({ nests, query, zone, year }: NestsTableProps): ReactElement {
  return (
    <Table caption="Nests">
      <thead>
        <tr>
          {COLUMNS.map(({ column, title, look }) => (
            <SortHead
              key={column}
              className={look}
              state={sortState(query.sort, column)}
              href={addressWith('/nests', { ...query, sort: nextSort(query.sort, column), page: undefined })}
            >
              {title}
            </SortHead>
          ))}
          <HeadCell className="hidden sm:table-cell">Reading</HeadCell>
        </tr>
      </thead>
      <tbody>
        {nests.map((nest) => (
          <NestCells key={nest.id} nest={nest} zone={zone} year={year} />
        ))}
      </tbody>
    </Table>
  );
}
