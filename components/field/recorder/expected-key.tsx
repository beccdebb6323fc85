'use client';

import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { earlierLine } from '@/components/field/words/cell-words';
import { STATE_WORDS } from '@/lib/comb/states';
import { type Desk, pressExpected } from './desk';
import { expectedHere } from './expected-states';

/** One press for a cell that holds what was expected. It stays in its place where nothing is, so that no key moves. */
export function ExpectedKey({ desk }: { desk: Desk }): ReactElement | null {
  const { view } = desk.recorder;
  if (desk.expected.size === 0) return null;
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
          {state ? `As expected: ${STATE_WORDS[state]}` : 'Nothing expected here'}
        </span>
        <span className="block truncate">{earlierLine(view) ?? '\u00a0'}</span>
      </span>
    </button>
  );
}
