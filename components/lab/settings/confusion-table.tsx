import type { ReactElement } from 'react';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { numberText } from '@/lib/brood/team-settings/compare-content';
import { type ConfusionRows, RECORDED_CLASSES, TRUE_CLASSES } from '@/lib/brood/team-settings/confusion-rows';
import { CLASS_WORDS } from './class-words';

/** What is recorded where something is true, as shares of the row; with trust and source of each row. */
export function ConfusionTable({ confusion }: { confusion: ConfusionRows }): ReactElement {
  return (
    <Section id="confusion" title="How readers err" className="mt-8">
      <p className="mb-2 text-quiet">
        Each row says how often each state is recorded where this one is true; it adds up to 1. A mark that says unsure
        doubles the errors.
      </p>
      <Table scrolls caption="Shares recorded, by what is true" className="text-[0.9375rem]">
        <thead>
          <tr>
            <HeadCell className="min-w-44">True</HeadCell>
            {RECORDED_CLASSES.map((seen) => (
              <HeadCell key={seen} className="text-right">
                {seen}
              </HeadCell>
            ))}
            <HeadCell>Trust</HeadCell>
            <HeadCell className="min-w-56">Source</HeadCell>
          </tr>
        </thead>
        <tbody>
          {TRUE_CLASSES.map((name) => {
            const { row, trust, source } = confusion[name];
            return (
              <tr key={name}>
                <BodyCell>
                  <span className="font-mono">{name}</span>
                  <span className="block text-sm text-quiet">{CLASS_WORDS[name]}</span>
                </BodyCell>
                {RECORDED_CLASSES.map((seen) => (
                  <BodyCell key={seen} number>
                    {row[seen] ? numberText(Number(row[seen].toFixed(4))) : ''}
                  </BodyCell>
                ))}
                <BodyCell className="whitespace-nowrap">{trust}</BodyCell>
                <BodyCell className="text-sm">{source}</BodyCell>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Section>
  );
}
