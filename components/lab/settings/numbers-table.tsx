import type { ReactElement } from 'react';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { Setting } from '@/lib/brood/settings';
import { numberText } from '@/lib/brood/team-settings/compare-content';
import { SETTING_GROUPS, type SettingGroup } from '@/lib/brood/team-settings/setting-groups';
import { sentence } from '@/components/ui/sentence';

interface NumbersTableProps {
  values: Readonly<Record<string, Setting>>;
}

function GroupTable({ group, values }: NumbersTableProps & { group: SettingGroup }): ReactElement {
  return (
    <Table scrolls caption={group.title} className="text-[0.9375rem]">
      <thead>
        <tr>
          <HeadCell className="lg:w-[26rem]">Setting</HeadCell>
          <HeadCell className="text-right lg:w-36">Value</HeadCell>
          <HeadCell className="lg:w-32">Trust</HeadCell>
          <HeadCell className="min-w-56">Source</HeadCell>
        </tr>
      </thead>
      <tbody>
        {group.items.map(({ name, label, unit, does, default: first }) => {
          const { value, trust, source } = values[name] ?? first;
          return (
            <tr key={name}>
              <BodyCell className="min-w-56">
                {sentence(label)}
                <span className="block text-sm text-quiet">{does}</span>
              </BodyCell>
              <BodyCell number className="whitespace-nowrap">
                {numberText(value)} <span className="font-sans text-sm text-quiet">{unit}</span>
              </BodyCell>
              <BodyCell className="whitespace-nowrap">{trust}</BodyCell>
              <BodyCell className="text-sm">{source}</BodyCell>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

/** Every number of a version in its groups: value, what it does, how far it can be trusted, where it comes from. */
export function NumbersTable({ values }: NumbersTableProps): ReactElement {
  return (
    <>
      {SETTING_GROUPS.map((group) => (
        <Section key={group.id} id={`group-${group.id}`} title={group.title} className="mt-8">
          <GroupTable group={group} values={values} />
        </Section>
      ))}
    </>
  );
}
