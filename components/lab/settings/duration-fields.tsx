import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { Input } from '@/components/ui/input';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { DurationFactor } from '@/lib/brood/team-settings/content';
import type { DraftForm, TypedDurations } from './draft-form';
import { OriginFields } from './origin-fields';

interface DurationFieldsProps {
  form: DraftForm;
  onChange: (form: DraftForm) => void;
  wrong: ReadonlySet<string>;
}

const DAYS = [
  ['egg', 'egg, days'],
  ['larva', 'larva, days'],
  ['capped', 'capped, days'],
  ['referenceC', 'nest temperature, °C'],
] as const;

interface RowProps {
  row: TypedDurations;
  isWrong: boolean;
  onChange: (row: TypedDurations) => void;
  onRemove: () => void;
}

function DurationRowFields({ row, isWrong, onChange, onRemove }: RowProps): ReactElement {
  const name = row.taxon || 'new taxon';
  return (
    <tr className={isWrong ? 'bg-stop-wash' : ''}>
      <BodyCell>
        <Input
          aria-label={`Taxon of the row ${name}`}
          value={row.taxon}
          onChange={({ target }) => onChange({ ...row, taxon: target.value })}
          className="min-w-44 italic"
        />
      </BodyCell>
      {DAYS.map(([field, words]) => (
        <BodyCell key={field}>
          <Input
            aria-label={`${name}: ${words}`}
            inputMode="decimal"
            value={row[field]}
            onChange={({ target }) => onChange({ ...row, [field]: target.value })}
            className="min-w-18 px-1 text-right font-mono"
          />
        </BodyCell>
      ))}
      <BodyCell>
        <span className="flex gap-2">
          <OriginFields
            label={`durations of ${name}`}
            origin={row}
            onChange={(origin) => onChange({ ...row, ...origin })}
          />
        </span>
      </BodyCell>
      <BodyCell className="relative">
        <Button tone="quiet" onClick={onRemove}>
          Remove<span className="sr-only"> {name}</span>
        </Button>
      </BodyCell>
    </tr>
  );
}

/** Factors that came from the team's own nests; they can only be taken out here. */
function FactorList({
  factors,
  onRemove,
}: {
  factors: readonly DurationFactor[];
  onRemove: (taxon: string) => void;
}): ReactElement | null {
  if (factors.length === 0) return null;
  return (
    <ul className="mt-3 flex flex-col gap-1">
      {factors.map(({ taxon, logMean, source }) => (
        <li key={taxon}>
          <i>{taxon}</i>: {Math.exp(-logMean).toFixed(2)} times as long ({source}){' '}
          <Button tone="quiet" onClick={() => onRemove(taxon)}>
            Take out the factor<span className="sr-only"> of {taxon}</span>
          </Button>
        </li>
      ))}
    </ul>
  );
}

function newRow(rows: readonly TypedDurations[]): TypedDurations {
  const model = rows.find(({ taxon }) => taxon === 'Polistes') ?? rows[0];
  const days = { egg: '', larva: '', capped: '', referenceC: model?.referenceC ?? '25' };
  return { key: `new ${rows.length}`, taxon: '', ...days, trust: 'assumption', source: '' };
}

/** The durations of the draft, one row a taxon. */
export function DurationFields({ form, onChange, wrong }: DurationFieldsProps): ReactElement {
  const { durations, durationFactors } = form;
  const put = (rows: readonly TypedDurations[]): void => onChange({ ...form, durations: rows });
  return (
    <Section id="durations" title="Stage durations" className="mt-8">
      <Table caption="Stage durations by taxon">
        <thead>
          <tr>
            <HeadCell>Taxon</HeadCell>
            {['Egg', 'Larva', 'Capped', 'At °C'].map((title) => (
              <HeadCell key={title} className="text-right">
                {title}
              </HeadCell>
            ))}
            <HeadCell className="min-w-80">Trust and source</HeadCell>
            <HeadCell className="relative">
              <span className="sr-only">Remove</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {durations.map((row) => (
            <DurationRowFields
              key={row.key}
              row={row}
              isWrong={wrong.has(`durations.${row.taxon.trim()}`)}
              onChange={(next) => put(durations.map((own) => (own.key === row.key ? next : own)))}
              onRemove={() => put(durations.filter(({ key }) => key !== row.key))}
            />
          ))}
        </tbody>
      </Table>
      <Button className="mt-3" onClick={() => put([...durations, newRow(durations)])}>
        Add a taxon
      </Button>
      <FactorList
        factors={durationFactors}
        onRemove={(taxon) =>
          onChange({ ...form, durationFactors: durationFactors.filter((factor) => factor.taxon !== taxon) })
        }
      />
    </Section>
  );
}
