import type { ReactElement } from 'react';
import { Input } from '@/components/ui/input';
import { Section } from '@/components/ui/section';
import { sentence } from '@/components/ui/sentence';
import { numberText } from '@/lib/brood/team-settings/compare-content';
import { SETTING_GROUPS, type SettingItem } from '@/lib/brood/team-settings/setting-groups';
import type { DraftForm, TypedValue } from './draft-form';
import { OriginFields } from './origin-fields';

interface NumberFieldsProps {
  form: DraftForm;
  onChange: (form: DraftForm) => void;
  /** Fields that cannot stand, such as `values.lossEgg`. */
  wrong: ReadonlySet<string>;
}

interface NumberFieldProps {
  item: SettingItem;
  value: TypedValue;
  isWrong: boolean;
  onChange: (value: TypedValue) => void;
}

function NumberField({ item, value, isWrong, onChange }: NumberFieldProps): ReactElement {
  const { name, label, unit, does, min, max } = item;
  return (
    <li className="keep-together flex flex-col gap-1 border-b border-rule py-2 lg:grid lg:grid-cols-[minmax(0,1.2fr)_9rem_minmax(0,1.3fr)] lg:items-center lg:gap-x-4">
      <div>
        <label htmlFor={`value-${name}`}>{sentence(label)}</label>
        <p id={`value-${name}-hint`} className="text-sm text-quiet">
          {does} {numberText(min)} to {numberText(max)}.
        </p>
      </div>
      <span className="flex items-center gap-2">
        <Input
          id={`value-${name}`}
          inputMode="decimal"
          aria-describedby={`value-${name}-hint`}
          value={value.text}
          aria-invalid={isWrong || undefined}
          onChange={({ target }) => onChange({ ...value, text: target.value })}
          className="max-w-24 text-right font-mono"
        />
        <span className="text-sm text-quiet">{unit}</span>
      </span>
      <span className="flex gap-2">
        <OriginFields label={label} origin={value} onChange={(origin) => onChange({ ...value, ...origin })} />
      </span>
    </li>
  );
}

/** Every number of the draft in its groups. */
export function NumberFields({ form, onChange, wrong }: NumberFieldsProps): ReactElement {
  return (
    <>
      {SETTING_GROUPS.map(({ id, title, items }) => (
        <Section key={id} id={`group-${id}`} title={title} className="mt-8">
          <ul>
            {items.map((item) => {
              const { name, default: first } = item;
              const value = form.values[name] ?? { text: String(first.value), ...first };
              return (
                <NumberField
                  key={name}
                  item={item}
                  value={value}
                  isWrong={wrong.has(`values.${name}`)}
                  onChange={(next) => onChange({ ...form, values: { ...form.values, [name]: next } })}
                />
              );
            })}
          </ul>
        </Section>
      ))}
    </>
  );
}
