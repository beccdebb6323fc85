import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { tallyWords } from '@/components/comb/comb-view';
import { TallyLine } from '@/components/comb/tally-line';
import { Bench } from '@/components/lab/bench/bench';
import { BenchNotices } from '@/components/lab/bench/bench-notices';
import { CellsTable } from '@/components/lab/bench/cells-table';
import { ReadingTitle } from '@/components/lab/bench/reading-title';
import { cellLines } from '@/components/lab/cell-lines';
import { cellSizeFor } from '@/components/lab/cell-size';
import { CombInspector } from '@/components/lab/comb-inspector';
import { HistoryList } from '@/components/lab/history-list';
import { NoReading } from '@/components/lab/no-reading';
import { readingCells } from '@/components/lab/reading-cells';
import { settles } from '@/components/shell/role-words';
import { countWords } from '@/components/ui/date-words';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { requirePage } from '@/lib/server/auth/current-session';
import { nestDetail } from '@/lib/server/queries/nest-detail';
import { readingDetail } from '@/lib/server/queries/reading-detail';
import { readingReview } from '@/lib/server/queries/reading-review';
import { foundOrAway, problemCode } from '@/app/(lab)/problem-code';

/** Room for the comb beside the bench, in CSS pixels. */
const COLUMN_PX = 470;

export const metadata: Metadata = { title: 'Reading' };

interface ReadingPageProps {
  params: Promise<{ id: string; readingId: string }>;
}

/** The reading with its review; null while the person has to stay blind to it. */
async function visible(session: TeamContext, id: string) {
  try {
    const [reading, review] = await Promise.all([readingDetail(session, id), readingReview(session, id)]);
    return { reading, review };
  } catch (thrown) {
    if (problemCode(thrown) === 'blind') return null;
    throw thrown;
  }
}

/** One reading cell by cell: reviewers settle, lock and amend it here, everybody else reads it. */
export default async function ReadingPage({ params }: ReadingPageProps): Promise<ReactElement> {
  const session = await requirePage('readings.read');
  const { id, readingId } = await params;
  const [nest, seen] = await foundOrAway(Promise.all([nestDetail(session, id), visible(session, readingId)]));
  if (!seen) return <NoReading hidden />;
  const { reading, review } = seen;
  if (reading.nest !== nest.id) notFound();
  const { zone } = session;
  const year = localDate(systemClock.now(), zone);
  const { final, settlements } = review;
  const cells = readingCells(reading.marks, reading.kind === 'final' ? settlements : []);
  const label = `Comb of ${nest.code}, ${countWords(cells.length, 'cell')}: ${tallyWords(reading.tally).join(', ')}`;
  const size = cellSizeFor(cells, COLUMN_PX);
  const isAtBench = settles(session.role) && (final === null || final.id === reading.id);
  const lockedVersion = final !== null && final.version === final.lockedVersion ? final.version : null;
  return (
    <>
      <ReadingTitle nest={nest} reading={reading} final={final} zone={zone} />
      <BenchNotices nest={nest.id} reading={reading} review={review} settles={settles(session.role)} />
      {isAtBench ? (
        <Bench
          nest={nest.id}
          reading={reading.id}
          label={label}
          cells={cells}
          cellSize={size}
          lockedVersion={lockedVersion}
        />
      ) : (
        <div className="max-w-[30rem]">
          <CombInspector
            cells={cells}
            label={label}
            cellSize={size}
            lines={cellLines(reading.marks, [], year)}
            tells="its marks and note"
          />
          <CombKey cells={cells} className="mt-3" />
        </div>
      )}
      <Section id="history" title="Settled in the lab" className="mt-10">
        <HistoryList review={review} zone={zone} year={year} />
      </Section>
      <Section id="cells" title="Cell by cell" className="mt-10">
        <TallyLine tally={reading.tally} className="mb-3" />
        <CellsTable marks={reading.marks} zone={zone} year={year} />
      </Section>
    </>
  );
}
