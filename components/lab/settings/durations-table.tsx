import type { ReactElement } from 'react';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { numberText } from '@/lib/brood/team-settings/compare-content';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import { TaxonName } from '@/components/lab/taxon-name';

/** Stage durations by taxon, and what the team's own nests have shown of them. */
export function DurationsTable({
  durations,
  durationFactors,
}: Pick<SettingsContent, 'durations' | 'durationFactors'>): ReactElement {
  return (
    <Section id="durations" title="Stage durations" className="mt-8">
      <p className="mb-2 text-quiet">
        Days of each stage at the nest temperature given. The row of <i>Polistes</i> serves every taxon without one of
        its own.
      </p>
      <Table scrolls caption="Stage durations by taxon, days" className="text-[0.9375rem]">
        <thead>
          <tr>
            <HeadCell className="min-w-40">Taxon</HeadCell>
            {['Egg', 'Larva', 'Capped', 'At °C', 'Factor'].map((title) => (
              <HeadCell key={title} className="text-right">
                {title}
              </HeadCell>
            ))}
            <HeadCell>Trust</HeadCell>
            <HeadCell className="min-w-56">Source</HeadCell>
          </tr>
        </thead>
        <tbody>
          {durations.map(({ taxon, egg, larva, capped, referenceC, trust, source }) => {
            const factor = durationFactors.find((own) => own.taxon === taxon);
            return (
              <tr key={taxon}>
                <BodyCell>
                  <TaxonName>{taxon}</TaxonName>
                </BodyCell>
                {[egg, larva, capped, referenceC].map((value, i) => (
                  <BodyCell key={i} number>
                    {numberText(value)}
                  </BodyCell>
                ))}
                <BodyCell number>{factor ? Math.exp(-factor.logMean).toFixed(2) : '1'}</BodyCell>
                <BodyCell className="whitespace-nowrap">{trust}</BodyCell>
                <BodyCell className="text-sm">
                  {source}
                  {factor && <span className="block">Factor: {factor.source}</span>}
                </BodyCell>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Section>
  );
}
