import type { ReactElement } from 'react';
import { Input } from '@/components/ui/input';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { RECORDED_CLASSES, TRUE_CLASSES, type TrueClass } from '@/lib/brood/team-settings/confusion-rows';
import { CLASS_WORDS } from './class-words';
import { type DraftForm, type TypedRow, rowIn, typedSum } from './draft-form';
import { OriginFields } from './origin-fields';

interface ConfusionFieldsProps {
  form: DraftForm;
  onChange: (form: DraftForm) => void;
  wrong: ReadonlySet<string>;
}

interface RowFieldsProps {
  name: TrueClass;
  row: TypedRow;
  isWrong: boolean;
  onChange: (row: TypedRow) => void;
}

function RowFields({ name, row, isWrong, onChange }: RowFieldsProps): ReactElement {
  const sum = typedSum(row);
  return (
    <tr className={isWrong ? 'bg-stop-wash' : ''}>
      <BodyCell>
        <span className="font-mono">{name}</span>
        <span className="block text-sm text-quiet">{CLASS_WORDS[name]}</span>
      </BodyCell>
      {RECORDED_CLASSES.map((seen) => (
        <BodyCell key={seen}>
          <Input
            aria-label={`True ${name}, recorded ${seen}`}
            aria-invalid={isWrong || undefined}
            inputMode="decimal"
            value={row.shares[seen] ?? ''}
            onChange={({ target }) => onChange({ ...row, shares: { ...row.shares, [seen]: target.value } })}
            className="min-w-16 px-1 text-right font-mono text-sm"
          />
        </BodyCell>
      ))}
      <BodyCell number className={isWrong ? 'font-bold text-stop' : ''}>
        {Number.isNaN(sum) ? '?' : Number(sum.toFixed(6))}
      </BodyCell>
      <BodyCell>
        <span className="flex gap-2">
          <OriginFields
            label={`confusion, row ${name}`}
            origin={row}
            onChange={(origin) => onChange({ ...row, ...origin })}
          />
        </span>
      </BodyCell>
    </tr>
  );
}

/** The confusion of the draft, row by row with its sum. */
export function ConfusionFields({ form, onChange, wrong }: ConfusionFieldsProps): ReactElement {
  return (
    <Section id="confusion" title="How readers err" className="mt-8">
      <p className="mb-2 text-quiet">Shares of each row add up to 1; leave a field blank for never.</p>
      <Table caption="Shares recorded, by what is true">
        <thead>
          <tr>
            <HeadCell className="min-w-40">True</HeadCell>
            {RECORDED_CLASSES.map((seen) => (
              <HeadCell key={seen} className="text-right">
                {seen}
              </HeadCell>
            ))}
            <HeadCell className="text-right">Sum</HeadCell>
            <HeadCell className="min-w-80">Trust and source</HeadCell>
          </tr>
        </thead>
        <tbody>
          {TRUE_CLASSES.map((name) => (
            <RowFields
              key={name}
              name={name}
              row={rowIn(form, name)}
              isWrong={wrong.has(`confusion.${name}`)}
              onChange={(row) => onChange({ ...form, confusion: { ...form.confusion, [name]: row } })}
            />
          ))}
        </tbody>
      </Table>
    </Section>
  );
}
