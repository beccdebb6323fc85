import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';

interface CompareFormProps {
  /** The newest version; every one from 0 to it can be chosen. */
  latest: number;
  from: number;
  to: number;
}

/** Chooses two versions; a plain form, so that it works without script and can be linked to. */
export function CompareForm({ latest, from, to }: CompareFormProps): ReactElement {
  const versions = Array.from({ length: latest + 1 }, (_, version) => version);
  return (
    <form method="get" action="/settings/compare" className="print-hidden flex flex-wrap items-end gap-3">
      {(
        [
          ['from', 'Before', from],
          ['to', 'After', to],
        ] as const
      ).map(([name, label, chosen]) => (
        <Field key={name} id={`compare-${name}`} label={label} className="w-44">
          {(control) => (
            <select
              {...control}
              name={name}
              defaultValue={chosen}
              className="min-h-9 rounded border-2 border-edge bg-paper px-2"
            >
              {versions.map((version) => (
                <option key={version} value={version}>
                  {version === 0 ? 'Product’s defaults' : `Version ${version}`}
                </option>
              ))}
            </select>
          )}
        </Field>
      ))}
      <Button type="submit">Compare</Button>
    </form>
  );
}
