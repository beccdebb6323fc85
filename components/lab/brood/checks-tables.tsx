import type { ReactElement } from 'react';
import { DateRangeWords } from '@/components/ui/date-range';
import { runWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { CheckedRange, EventCounts } from '@/lib/brood/what-happened';
import { checkLines, EVENT_WORDS, hasChecks, hitWords, lostWords, seenWords } from './check-words';

/** The ranges given at one visit, counted against later readings. */
export interface VisitChecks {
  key: string;
  /** `Check, 18 June, 05:35`. */
  label: string;
  counts: readonly EventCounts[];
}

/** How often the ranges of each earlier visit held. */
export function HitsTable({ visits }: { visits: readonly VisitChecks[] }): ReactElement {
  return (
    <Table scrolls caption="How many ranges held, by the visit they were given at" className="text-sm">
      <thead>
        <tr>
          <HeadCell>Given at</HeadCell>
          <HeadCell>Event</HeadCell>
          <HeadCell>50 in 100</HeadCell>
          <HeadCell>80 in 100</HeadCell>
          <HeadCell>95 in 100</HeadCell>
        </tr>
      </thead>
      <tbody>
        {visits.flatMap(({ key, label, counts }) =>
          counts.map((count) => (
            <tr key={`${key} ${count.event}`}>
              <BodyCell>{label}</BodyCell>
              <BodyCell>
                {EVENT_WORDS[count.event]}
                {count.lost > 0 && <span className="block text-quiet">{lostWords([count])}</span>}
              </BodyCell>
              <BodyCell>{hitWords(count.p50)}</BodyCell>
              <BodyCell>{hitWords(count.p80)}</BodyCell>
              <BodyCell>{hitWords(count.p95)}</BodyCell>
            </tr>
          )),
        )}
      </tbody>
    </Table>
  );
}

/** Is there a visit whose ranges can be held against anything? */
export function anyChecks(visits: readonly VisitChecks[]): boolean {
  return visits.some(({ counts }) => hasChecks(counts));
}

interface ChecksTableProps {
  checks: readonly CheckedRange[];
  year: string;
}

/** Cell by cell what was given as known then, and what was seen since. */
export function ChecksTable({ checks, year }: ChecksTableProps): ReactElement {
  return (
    <Table scrolls caption="Ranges as known then, and what later readings showed" className="text-sm">
      <thead>
        <tr>
          <HeadCell>Cells</HeadCell>
          <HeadCell>Event</HeadCell>
          <HeadCell>Expected, 8 times in 10</HeadCell>
          <HeadCell>Seen since</HeadCell>
        </tr>
      </thead>
      <tbody>
        {checkLines(checks).map(({ cells, check: { event, predicted, seen, lookedUntil } }) => (
          <tr key={`${cells.join()} ${event}`}>
            <BodyCell className="font-mono">{runWords(cells)}</BodyCell>
            <BodyCell>{EVENT_WORDS[event]}</BodyCell>
            <BodyCell>
              <DateRangeWords median={predicted.median} ends={predicted.p80} inYear={year} />
            </BodyCell>
            <BodyCell>{seenWords(seen, lookedUntil, year)}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
