import type { ReactElement } from 'react';
import { dateWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { DaySummary } from '@/lib/brood/temperature/day-summary';

const degrees = (celsius: number | null): string => (celsius === null ? '–' : celsius.toFixed(1));
const hours = (count: number): string => (count < 0.05 ? '' : count.toFixed(1));

/** A record day by day in numbers: the same days as the chart. */
export function TemperatureTable({ days, inYear }: { days: readonly DaySummary[]; inYear: string }): ReactElement {
  return (
    <Table scrolls caption="Temperature day by day" className="text-sm sm:max-w-xl">
      <thead>
        <tr>
          <HeadCell>Day</HeadCell>
          <HeadCell className="text-right">Lowest, °C</HeadCell>
          <HeadCell className="text-right">Highest, °C</HeadCell>
          <HeadCell className="text-right">Hours filled</HeadCell>
          <HeadCell className="text-right">Hours not measured</HeadCell>
          <HeadCell className="text-right">Counts for days</HeadCell>
        </tr>
      </thead>
      <tbody>
        {days.map(({ date, min, max, drawnHours, calendarHours, development }) => (
          <tr key={date}>
            <BodyCell className="whitespace-nowrap">{dateWords(date, inYear)}</BodyCell>
            <BodyCell number>{degrees(min)}</BodyCell>
            <BodyCell number>{degrees(max)}</BodyCell>
            <BodyCell number>{hours(drawnHours)}</BodyCell>
            <BodyCell number>{hours(calendarHours)}</BodyCell>
            <BodyCell number>{development.toFixed(2)}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
