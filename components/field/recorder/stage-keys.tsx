'use client';

import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { type CellState, EVERYDAY_STATES, FURTHER_STATES } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';

/** The word on a key; short, because the six everyday keys are read hundreds of times a day. */
const KEY_WORDS: Readonly<Record<CellState, string>> = {
  unread: 'Unread',
  empty: 'Empty',
  egg: 'Egg',
  small: 'Small',
  medium: 'Medium',
  large: 'Large',
  capped: 'Capped',
  opened: 'Opened',
  dead: 'Dead',
  parasitised: 'Parasitised',
  webbed: 'Webbed',
  damaged: 'Damaged',
};

interface StageKeyProps {
  state: CellState;
  /** The state of the current cell, or the one being painted with. */
  chosen: boolean;
  /** Cells in this state so far: the running tally stands where the eyes are. */
  count: number;
  onPress: (state: CellState) => void;
}

/** One key: the cell as it is drawn on the comb, over its word in black on white. Acts on release inside it. */
function StageKey({ state, chosen, count, onPress }: StageKeyProps): ReactElement {
  return (
    <button
      type="button"
      aria-pressed={chosen}
      onClick={() => onPress(state)}
      className="relative flex h-[clamp(5.625rem,11.4dvh,7.5rem)] min-w-0 touch-manipulation flex-col overflow-hidden rounded-xl border-3 border-ink bg-paper font-bold select-none active:border-main active:bg-main-wash aria-pressed:outline-4 aria-pressed:-outline-offset-1 aria-pressed:outline-main"
    >
      <span
        className={`comb-cell cell-${state} flex w-full flex-1 items-center justify-center bg-[var(--cell)] max-[359px]:[&>svg]:size-9`}
      >
        <CellGlyph state={state} size={52} />
      </span>
      {count > 0 && (
        <span
          aria-hidden="true"
          className="absolute top-0 right-0 min-w-7 rounded-bl-lg border-b-2 border-l-2 border-ink bg-paper px-1 tabular-nums"
        >
          {count}
        </span>
      )}
      <span className="w-full border-t-3 border-ink py-0.5 text-xl leading-tight max-[359px]:text-lg">
        {KEY_WORDS[state]}
      </span>
    </button>
  );
}

interface StageKeysProps {
  chosen: CellState | null;
  tally: Tally;
  onPress: (state: CellState) => void;
}

/** The six everyday states. */
export function EverydayKeys(props: StageKeysProps): ReactElement {
  return <Keys states={EVERYDAY_STATES} {...props} />;
}

/** The states that are seldom seen. */
export function FurtherKeys(props: StageKeysProps): ReactElement {
  return (
    <div className="grid grid-cols-2 gap-gap sm:grid-cols-3">
      <Keys states={FURTHER_STATES} {...props} />
    </div>
  );
}

function Keys({ states, chosen, tally, onPress }: StageKeysProps & { states: readonly CellState[] }): ReactElement {
  return (
    <>
      {states.map((state) => (
        <StageKey key={state} state={state} chosen={state === chosen} count={tally[state]} onPress={onPress} />
      ))}
    </>
  );
}
