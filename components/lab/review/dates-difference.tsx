import type { ReactElement } from 'react';
import { DateRangeWords } from '@/components/ui/date-range';
import { countWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { NestDates } from '@/lib/brood/laying-difference';
import type { ComparedView } from './review-shapes';
import { daysWords } from './review-words';

function Dated({ dates, year }: { dates: NestDates['founded']; year: string }): ReactElement {
  return dates ? (
    <DateRangeWords median={dates.median} ends={dates.p80} inYear={year} />
  ) : (
    <span className="text-quiet">cannot be dated</span>
  );
}

/** What the readers' differences mean in time: cell by cell in days, and for the nest as ranges. */
export function DatesDifference({ compared, year }: { compared: ComparedView; year: string }): ReactElement {
  const { dates } = compared;
  const { medianDays, largestDays } = dates;
  return (
    <>
      <p className="mb-2 max-w-text">
        {medianDays === null || largestDays === null
          ? 'No cell is dated by both readings.'
          : `${countWords(dates.cells, 'cell')} dated by both: estimated laying dates lie ${daysWords(medianDays)} apart at the median, at most ${daysWords(largestDays)}.`}
      </p>
      <Table caption="Dates of the nest by each reading alone" className="max-w-3xl">
        <thead>
          <tr>
            <HeadCell>Nest</HeadCell>
            <HeadCell>By the field reading</HeadCell>
            <HeadCell>By the second reading</HeadCell>
          </tr>
        </thead>
        <tbody>
          <tr>
            <BodyCell>founded</BodyCell>
            <BodyCell>
              <Dated dates={dates.field.founded} year={year} />
            </BodyCell>
            <BodyCell>
              <Dated dates={dates.lab.founded} year={year} />
            </BodyCell>
          </tr>
          <tr>
            <BodyCell>first adult</BodyCell>
            <BodyCell>
              <Dated dates={dates.field.firstEmergence} year={year} />
            </BodyCell>
            <BodyCell>
              <Dated dates={dates.lab.firstEmergence} year={year} />
            </BodyCell>
          </tr>
        </tbody>
      </Table>
      <p className="mt-1 text-sm text-quiet">
        Ranges hold four times in five. Estimates are estimates: read the range.
      </p>
    </>
  );
}
