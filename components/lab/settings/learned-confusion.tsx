import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { rowText } from '@/lib/brood/team-settings/compare-content';
import type { ConfusionRow } from '@/lib/brood/team-settings/confusion-rows';
import { CLASS_WORDS } from './class-words';
import type { LearningView } from './settings-shapes';

/** A row with three digits to a share. */
function shortRow(row: ConfusionRow): string {
  return rowText(Object.fromEntries(Object.entries(row).map(([seen, share]) => [seen, Number(share.toFixed(3))])));
}

/** Each row of the confusion before and after the team's own double readings. */
export function LearnedConfusion({ confusion }: Pick<LearningView, 'confusion'>): ReactElement {
  return (
    <Table scrolls caption="Reader errors before and after the team’s own double readings">
      <thead>
        <tr>
          <HeadCell className="min-w-44">True</HeadCell>
          <HeadCell className="text-right">Cells</HeadCell>
          <HeadCell className="min-w-48">Before</HeadCell>
          <HeadCell className="min-w-48">After</HeadCell>
        </tr>
      </thead>
      <tbody>
        {confusion.map(({ name, n, prior, posterior }) => (
          <tr key={name}>
            <BodyCell>
              <span className="font-mono">{name}</span>
              <span className="block text-sm text-quiet">{CLASS_WORDS[name]}</span>
            </BodyCell>
            <BodyCell number>{Number(n.toFixed(1))}</BodyCell>
            <BodyCell>{shortRow(prior)}</BodyCell>
            <BodyCell>{shortRow(posterior)}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
