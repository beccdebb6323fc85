import type { ReactElement } from 'react';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { keptName } from './kept-name';
import type { KeptView } from './temperature-shapes';

/** A record that the new one stands in for, and why. */
export interface Replacing {
  id: string;
  reason: string;
}

interface ReplaceChoiceProps {
  /** Records in force. */
  records: readonly KeptView[];
  value: Replacing;
  onChange: (value: Replacing) => void;
}

/** Asks whether the new record stands in for one that is kept already. */
export function ReplaceChoice({ records, value, onChange }: ReplaceChoiceProps): ReactElement | null {
  if (records.length === 0) return null;
  return (
    <div className="flex flex-col gap-3">
      <Field
        id="replaces"
        label="Beside the records kept, or in place of one"
        hint="Where two records speak for the same moment, the later one counts."
      >
        {(control) => (
          <select
            {...control}
            value={value.id}
            onChange={(event) => onChange({ ...value, id: event.target.value })}
            className="min-h-9 w-full rounded border-2 border-edge bg-paper px-2"
          >
            <option value="">Beside them</option>
            {records.map((record) => (
              <option key={record.id} value={record.id}>
                In place of {keptName(record)}
              </option>
            ))}
          </select>
        )}
      </Field>
      {value.id !== '' && (
        <Field id="replace-reason" label="Why" hint="The record replaced stays on file with this reason." required>
          {(control) => (
            <TextArea
              {...control}
              rows={2}
              value={value.reason}
              onChange={(event) => onChange({ ...value, reason: event.target.value })}
            />
          )}
        </Field>
      )}
    </div>
  );
}
