import type { ReactElement } from 'react';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import type { SheetLine } from '@/lib/comb/sheet-letters';
import { cellsWithinRing } from '@/lib/comb/walk';
import { faultWords, ringWords } from './sheet-words';

interface RingLineProps {
  ring: number;
  text: string;
  line: SheetLine;
  onChange: (text: string) => void;
}

/** One ring of the sheet as a line to type: which cells it holds, how far it is, and what is wrong in it. */
export function RingLine({ ring, text, line, onChange }: RingLineProps): ReactElement {
  const size = ring === 0 ? 1 : cellsWithinRing(ring) - cellsWithinRing(ring - 1);
  return (
    <Field
      id={`ring-${ring}`}
      label={ringWords(ring)}
      hint={<span className="text-field">{`${Math.min(line.places, size)} of ${size} places`}</span>}
      error={line.faults.length > 0 ? line.faults.map(faultWords).join(' ') : null}
    >
      {(control) => (
        <Input
          {...control}
          value={text}
          onChange={(event) => onChange(event.target.value)}
          autoComplete="off"
          autoCapitalize="none"
          autoCorrect="off"
          spellCheck={false}
          maxLength={400}
          className="min-h-field border-3 font-mono text-2xl tracking-widest"
        />
      )}
    </Field>
  );
}
