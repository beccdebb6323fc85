import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import type { BroodFlag } from '@/lib/brood/answer';
import { cellNumber } from '@/lib/comb/walk';

/** What is surprising in the readings, cell by cell; nothing is refused for it. */
export function FlagsList({ flags }: { flags: readonly BroodFlag[] }): ReactElement | null {
  if (flags.length === 0) return null;
  return (
    <Notice tone="warn" title="Worth a second look" className="mt-4">
      <ul className="mt-1 flex flex-col gap-1">
        {flags.map(({ cell, code, text }) => (
          <li key={`${code}${cell ? cellNumber(cell) : ''}`}>
            {cell && <span className="font-bold">Cell {cellNumber(cell)}: </span>}
            {text}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
