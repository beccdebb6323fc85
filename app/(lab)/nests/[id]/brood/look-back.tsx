import type { ReactElement } from 'react';
import type { BroodStop } from '@/components/lab/brood/brood-stops';
import { anyChecks, ChecksTable, HitsTable } from '@/components/lab/brood/checks-tables';
import { Disclosure } from '@/components/ui/disclosure';
import type { BroodEstimate } from '@/lib/brood/answer';
import type { BroodReading } from '@/lib/brood/input';
import { whatHappened } from '@/lib/brood/what-happened';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { MOST_CHECKED, nestBroodHits } from '@/lib/server/queries/brood-visits';
import type { NestView } from '@/components/lab/lab-shapes';

interface LookBackProps {
  session: TeamContext;
  nest: NestView;
  readings: readonly BroodReading[];
  stops: readonly BroodStop[];
  estimate: BroodEstimate;
  year: string;
}

/** Ranges given at earlier visits beside what later readings showed. Takes an estimate a visit, so it comes last. */
export async function LookBack(props: LookBackProps): Promise<ReactElement> {
  const { session, nest, readings, stops, estimate, year } = props;
  if (readings.length < 2)
    return <p className="text-quiet">Nothing to compare before the comb was read a second time.</p>;
  const labelOf = (reading: string): string => {
    const visit = nest.visits.find((candidate) => candidate.readings.some(({ id }) => id === reading));
    return stops.find(({ key }) => key === visit?.id)?.label ?? 'Visit';
  };
  const hits = await nestBroodHits(session, nest.id, readings);
  const visits = hits.map(({ reading, counts }) => ({ key: reading, label: labelOf(reading), counts }));
  const checks = whatHappened(estimate, readings);
  return (
    <>
      {anyChecks(visits) ? (
        <>
          <HitsTable visits={visits} />
          <p className="mt-2 text-quiet">
            How many ranges held. A range counts once it had run out by the last look into its cell. An event is only
            known to lie between two visits: where these days reach across an end of the range, the count says from how
            many to how many. Cells of one nest go together, so few nests tell little.
            {readings.length - 1 > MOST_CHECKED && ` The latest ${MOST_CHECKED} visits are looked at.`}
          </p>
        </>
      ) : (
        <p className="text-quiet">No cell that held brood at an earlier visit was looked into again.</p>
      )}
      {checks.length > 0 && (
        <Disclosure summary="Cell by cell: expected then, seen since" className="print-hidden mt-2">
          <ChecksTable checks={checks} year={year} />
        </Disclosure>
      )}
    </>
  );
}
