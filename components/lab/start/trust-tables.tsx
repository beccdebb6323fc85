import type { ReactElement } from 'react';
import { sentence } from '@/components/ui/sentence';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { DurationRow } from '@/lib/brood/durations';
import { type BroodSettings, SETTING_RULES, type SettingName } from '@/lib/brood/settings';
import { settingWords } from './limits';

/** Stage durations by species, with where they come from. */
export function DurationsTable({ rows }: { rows: readonly DurationRow[] }): ReactElement {
  return (
    <Table caption="How long each stage takes, in days" scrolls>
      <thead>
        <tr>
          <HeadCell>Species</HeadCell>
          <HeadCell className="text-right">Egg</HeadCell>
          <HeadCell className="text-right">Larva</HeadCell>
          <HeadCell className="text-right">Capped</HeadCell>
          <HeadCell className="text-right whitespace-nowrap">at °C</HeadCell>
          <HeadCell>Trust</HeadCell>
          <HeadCell>From</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ taxon, egg, larva, capped, referenceC, trust, source }) => (
          <tr key={taxon}>
            <BodyCell className="whitespace-nowrap italic">
              {taxon === 'Polistes' ? 'any other Polistes' : taxon}
            </BodyCell>
            <BodyCell number>{egg}</BodyCell>
            <BodyCell number>{larva}</BodyCell>
            <BodyCell number>{capped}</BodyCell>
            <BodyCell number>{referenceC}</BodyCell>
            <BodyCell className="whitespace-nowrap">{trust}</BodyCell>
            <BodyCell className="min-w-60 text-sm">{source}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** Every other number of the model, with where it comes from. */
export function SettingsTable({ values }: { values: BroodSettings['values'] }): ReactElement {
  const names = Object.keys(SETTING_RULES) as SettingName[];
  return (
    <Table caption="The other numbers of the model" scrolls>
      <thead>
        <tr>
          <HeadCell>Number</HeadCell>
          <HeadCell className="text-right">Value</HeadCell>
          <HeadCell>Trust</HeadCell>
          <HeadCell>From</HeadCell>
        </tr>
      </thead>
      <tbody>
        {names.map((name) => {
          const { value, trust, source } = values[name];
          const { label, unit } = SETTING_RULES[name];
          return (
            <tr key={name}>
              <BodyCell className="min-w-52">{sentence(label)}</BodyCell>
              <BodyCell number className="whitespace-nowrap">
                {settingWords(value, unit)}
              </BodyCell>
              <BodyCell className="whitespace-nowrap">{trust}</BodyCell>
              <BodyCell className="min-w-60 text-sm">{source}</BodyCell>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}
