import type { ReactElement } from 'react';
import { sentence } from '@/components/ui/sentence';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { SettingsChange } from '@/lib/brood/team-settings/compare-content';

interface ChangesTableProps {
  changes: readonly SettingsChange[];
  /** What the two sides are called. */
  titles: readonly [before: string, after: string];
}

/** What differs between two settings, side by side. */
export function ChangesTable({ changes, titles }: ChangesTableProps): ReactElement {
  if (changes.length === 0) return <p className="text-quiet">Nothing differs.</p>;
  return (
    <Table scrolls caption="What differs" className="text-[0.9375rem]">
      <thead>
        <tr>
          <HeadCell className="min-w-44">Setting</HeadCell>
          {titles.map((title) => (
            <HeadCell key={title} className="min-w-56">
              {title}
            </HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {changes.map(({ field, label, before, after }) => (
          <tr key={field}>
            <BodyCell>{sentence(label)}</BodyCell>
            <BodyCell>{before}</BodyCell>
            <BodyCell>{after}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
