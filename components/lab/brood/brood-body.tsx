import type { ReactElement, ReactNode } from 'react';
import { busyDays } from '@/components/charts/emergence-days';
import type { NestDate } from '@/components/charts/nest-dates-drawing';
import { broodRows } from '@/components/lab/brood-rows';
import { cellSizeFor } from '@/components/lab/cell-size';
import { FlagsList } from '@/components/lab/flags-list';
import { WhenBlock } from '@/components/lab/when-block';
import { countWords, dateWords } from '@/components/ui/date-words';
import { Section } from '@/components/ui/section';
import type { BroodEstimate } from '@/lib/brood/answer';
import { ageCells, ageLines } from './age-cells';
import { BroodComb } from './brood-comb';
import { figureFacts } from './figure-facts';
import { NestDatesPanel } from './nest-dates-panel';
import { PerDayPanel } from './per-day-panel';
import { StripsPanel } from './strips-panel';

/** Room for the comb at full width of the page, in CSS pixels. */
const COLUMN_PX = 448;

interface BroodBodyProps {
  code: string;
  estimate: BroodEstimate;
  /** The local day the estimate speaks for. */
  day: string;
  /** Days on which the comb had been read by then. */
  visits: readonly string[];
  /** The reader's year; dates of other years say theirs. */
  year: string;
  /** The look back over visits. */
  lookBack: ReactNode;
}

function nestDates({ nest }: BroodEstimate): NestDate[] {
  const { founded, firstEmergence } = nest;
  return [
    ...(founded ? [{ label: 'Founded', spread: founded }] : []),
    ...(firstEmergence ? [{ label: 'First adult', spread: firstEmergence }] : []),
  ].map(({ label, spread: { median, p50, p80, p95 } }) => ({ label, spread: { median, p50, p80, p95 } }));
}

function CombPart({ code, estimate, day, year }: BroodBodyProps): ReactElement {
  const cells = ageCells(estimate);
  if (cells.length === 0) return <p className="py-6 text-quiet">No cell is marked in this reading yet.</p>;
  const label = `Comb of ${code}, ${countWords(cells.length, 'cell')}, by the age of the brood`;
  return (
    <BroodComb
      cells={cells}
      label={label}
      cellSize={cellSizeFor(cells, COLUMN_PX)}
      lines={ageLines(estimate, year)}
      facts={figureFacts('brood-comb', { code, day, estimate })}
    />
  );
}

/** The brood of a nest as known at one time: comb, nest dates, strips, adults per day, and how earlier ranges held. */
export function BroodBody(props: BroodBodyProps): ReactElement {
  const { code, estimate, day, visits, year, lookBack } = props;
  const days = busyDays(estimate.nest.emergencePerDay);
  const named = { code, day, estimate };
  return (
    <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[28rem_minmax(0,1fr)] print:block">
      <div className="min-w-0 self-start lg:sticky lg:top-4">
        <CombPart {...props} />
      </div>
      <div className="min-w-0 print:mt-6">
        <Section id="when" title="When" aside={`as known on ${dateWords(day, year)}`}>
          <WhenBlock estimate={estimate} year={year} />
          <NestDatesPanel
            dates={nestDates(estimate)}
            visits={visits}
            asOf={day}
            facts={figureFacts('nest-dates', named)}
          />
          <FlagsList flags={estimate.flags} />
        </Section>
        <Section id="brood" title="Brood" className="mt-8">
          <StripsPanel rows={broodRows(estimate.cells)} asOf={day} facts={figureFacts('brood-strips', named)} />
        </Section>
        <Section id="per-day" title="Adults expected per day" className="mt-8">
          {days.length > 0 ? (
            <PerDayPanel days={days} asOf={day} facts={figureFacts('adults-per-day', named)} />
          ) : (
            <p className="text-quiet">No adult is expected in the days an estimate reaches.</p>
          )}
        </Section>
        <Section id="since" title="Expected then, seen since" className="mt-8">
          {lookBack}
        </Section>
      </div>
    </div>
  );
}
