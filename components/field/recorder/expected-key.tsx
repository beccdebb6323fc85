'use client';

import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { earlierLine } from '@/components/field/words/cell-words';
import type { Expectation } from '@/components/field/brood/use-expectation';
import { STATE_WORDS } from '@/lib/comb/states';
import { type Desk, pressExpected } from './desk';
import { expectedHere } from './expected-states';

interface ExpectedKeyProps {
  desk: Desk;
  standing: Expectation['standing'];
}

/** What stands on the key while there is nothing to press. */
const NOTHING_WORDS: Readonly<Record<Expectation['standing'], string>> = {
  computing: 'Expected today: computing …',
  ready: 'Nothing expected here',
  'second-reading': 'Second reading: look for yourself',
  'no-estimate': 'No estimate on this phone',
};

/**
 * One press for a cell that holds what was expected, and what it held at the last visit. It has its place from the start
 * wherever there was an earlier reading, so that nothing moves when the estimate comes.
 */
export function ExpectedKey({ desk, standing }: ExpectedKeyProps): ReactElement | null {
  const { view } = desk.recorder;
  if (view.last.size === 0) return null;
  const state = expectedHere(view, desk.expected);
  return (
    <button
      type="button"
      aria-disabled={state === null}
      onClick={() => pressExpected(desk)}
      className="flex min-h-field touch-manipulation items-center gap-3 rounded-xl border-3 border-ink bg-paper px-3 py-1 text-left leading-tight select-none active:bg-main-wash aria-disabled:border-rule aria-disabled:text-quiet"
    >
      {state && <CellGlyph state={state} size={40} />}
      <span className="min-w-0 flex-1">
        <span className="block truncate text-xl font-bold">
          {state ? `As expected: ${STATE_WORDS[state]}` : NOTHING_WORDS[standing]}
        </span>
        <span className="block truncate">{earlierLine(view) ?? '\u00a0'}</span>
      </span>
    </button>
  );
}
