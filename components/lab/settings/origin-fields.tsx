import type { ReactElement } from 'react';
import { Input } from '@/components/ui/input';
import { TRUST_WORDS, isTrust } from '@/lib/brood/trust';
import type { Origin } from './draft-form';

interface OriginFieldsProps {
  /** What the value is called, for the names of the fields. */
  label: string;
  origin: Origin;
  onChange: (origin: Origin) => void;
}

/** Chooses how far a value can be trusted and says where it comes from. */
export function OriginFields({ label, origin, onChange }: OriginFieldsProps): ReactElement {
  const { trust, source } = origin;
  return (
    <>
      <select
        aria-label={`Trust in: ${label}`}
        value={trust}
        onChange={({ target }) => isTrust(target.value) && onChange({ trust: target.value, source })}
        className="min-h-9 w-32 shrink-0 rounded border-2 border-edge bg-paper px-1"
      >
        {TRUST_WORDS.map((word) => (
          <option key={word} value={word}>
            {word}
          </option>
        ))}
      </select>
      <Input
        aria-label={`Source of: ${label}`}
        value={source}
        maxLength={200}
        onChange={({ target }) => onChange({ trust, source: target.value })}
        className="min-w-40 text-sm"
      />
    </>
  );
}
