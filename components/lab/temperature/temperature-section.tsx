import type { ReactElement } from 'react';
import { TemperatureDays, TemperatureKey, temperatureWords } from '@/components/charts/temperature-days';
import { TemperatureTable } from '@/components/charts/temperature-table';
import { recordsTemperature } from '@/components/shell/role-words';
import type { RoleName } from '@/components/shell/role-words';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { DayEntry } from './day-entry';
import { FileUpload } from './file-upload';
import { KeptList } from './kept-list';
import type { TemperatureView } from './temperature-shapes';

interface TemperatureSectionProps {
  nest: string;
  temperature: TemperatureView;
  role: RoleName;
  inYear: string;
}

/** How the dates of the nest use its record, in one sentence. */
function useWords({ kind, referenceC }: TemperatureView): string {
  if (kind === 'none') return 'No temperature record: a day counts as a day in every date of this nest.';
  const how = kind === 'logger' ? 'From a logger' : 'From lowest and highest of each day, with the hours drawn between';
  return `${how}. A day at ${referenceC} °C counts as one day of the durations; warmer ones for more, cooler ones for less.`;
}

function HeatNotice({ warnings }: Pick<TemperatureView, 'warnings'>): ReactElement | null {
  if (warnings.length === 0) return null;
  const isHot = warnings.some(({ code }) => code === 'heat');
  return (
    <Notice tone="warn" title={isHot ? 'It was too hot for brood' : 'About this record'} className="mt-3">
      <ul className="flex flex-col gap-1">
        {warnings.map(({ text }) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** What was measured at a nest, what was filled, and where a record comes in. */
export function TemperatureSection({ nest, temperature, role, inYear }: TemperatureSectionProps): ReactElement {
  const { days, limitC, warnings, records, zone } = temperature;
  const mayWrite = recordsTemperature(role);
  return (
    <Section id="temperature" title="Temperature" className="mt-8">
      <p className="mb-3 text-quiet">{useWords(temperature)}</p>
      {days.length > 0 && (
        <>
          <TemperatureDays days={days} limitC={limitC} inYear={inYear} />
          <TemperatureKey limitC={limitC} />
          <p className="mt-2 text-quiet">{temperatureWords(days, inYear)}</p>
          <Disclosure summary="The same days as a table" className="mt-2">
            <TemperatureTable days={days} inYear={inYear} />
          </Disclosure>
        </>
      )}
      <HeatNotice warnings={warnings} />
      <div className="mt-4 flex flex-col gap-4">
        <KeptList nest={nest} records={records} zone={zone} inYear={inYear} mayWrite={mayWrite} />
        {mayWrite && (
          <div className="print-hidden flex flex-col gap-2">
            <Disclosure summary="Add a temperature file">
              <FileUpload nest={nest} zone={zone} records={records.filter(({ removed }) => !removed)} />
            </Disclosure>
            <Disclosure summary="Note a day by hand">
              <DayEntry nest={nest} />
            </Disclosure>
          </div>
        )}
      </div>
    </Section>
  );
}
