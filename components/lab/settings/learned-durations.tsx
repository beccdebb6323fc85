import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { FactorRange } from '@/lib/brood/learning/duration-learning';
import { TaxonName } from '@/components/lab/taxon-name';
import type { LearningView } from './settings-shapes';

function factorWords({ median, p95 }: FactorRange): string {
  return `${median.toFixed(2)} (95 times in 100 between ${p95[0].toFixed(2)} and ${p95[1].toFixed(2)})`;
}

/** The factor on each taxon's durations before and after the team's own nests. */
export function LearnedDurations({ durations }: Pick<LearningView, 'durations'>): ReactElement {
  return (
    <Table scrolls caption="Factor on the stage durations before and after the team’s own nests">
      <thead>
        <tr>
          <HeadCell className="min-w-40">Taxon</HeadCell>
          <HeadCell className="text-right">Nests</HeadCell>
          <HeadCell className="text-right">Broods</HeadCell>
          <HeadCell className="min-w-48">Before</HeadCell>
          <HeadCell className="min-w-48">After</HeadCell>
        </tr>
      </thead>
      <tbody>
        {durations.map(({ row, nests, broods, prior, posterior }) => (
          <tr key={row.taxon}>
            <BodyCell>
              <TaxonName>{row.taxon}</TaxonName>
            </BodyCell>
            <BodyCell number>{nests}</BodyCell>
            <BodyCell number>{broods}</BodyCell>
            <BodyCell>{factorWords(prior)}</BodyCell>
            <BodyCell>{factorWords(posterior)}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
