import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { CAUTIONS, UNKNOWNS, TRUST_MEANINGS } from '@/components/lab/start/limits';
import { DurationsTable, SettingsTable } from '@/components/lab/start/trust-tables';
import { DescriptionList } from '@/components/ui/description-list';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { requirePage } from '@/lib/server/auth/current-session';
import { estimateSettings } from '@/lib/server/queries/estimate-settings';

export const metadata: Metadata = { title: 'What is not known' };

/** What the product does not know: cautions, open questions, and every number with its trust and source. */
export default async function LimitsPage(): Promise<ReactElement> {
  const session = await requirePage('settings.read');
  const { version, settings } = await estimateSettings(session);
  return (
    <>
      <PageTitle under="Before you rely on anything here.">What is not known</PageTitle>
      <div className="flex flex-col gap-10">
        <Section id="cautions" title="Cautions" className="max-w-[46rem]">
          <DescriptionList items={CAUTIONS.map(({ title, words }) => ({ term: title, children: words }))} />
        </Section>
        <Section id="unknown" title="No page here can tell you" className="max-w-[46rem]">
          <DescriptionList items={UNKNOWNS.map(({ title, words }) => ({ term: title, children: words }))} />
        </Section>
        <Section id="trust" title="How far a number can be trusted" className="max-w-[46rem]">
          <DescriptionList items={TRUST_MEANINGS.map(({ trust, words }) => ({ term: trust, children: words }))} />
        </Section>
        <Section
          id="durations"
          title="How long each stage takes"
          aside={version === 0 ? 'the product’s defaults' : `settings version ${version}`}
        >
          <p className="mb-3 max-w-text">
            Days from few nests each, without the temperature they grew at. Estimates widen their ranges for it.
          </p>
          <DurationsTable rows={settings.durations} />
        </Section>
        <Section id="numbers" title="The other numbers of the model">
          <SettingsTable values={settings.values} />
        </Section>
      </div>
    </>
  );
}
