'use client';

import type { ReactElement, ReactNode } from 'react';
import { CellGlyph, MarkGlyph } from '@/components/comb/cell-glyph';
import { shownToggles } from '@/components/field/recorder/recorder-acts';
import { NO_CELL_KEY } from '@/components/field/recorder/key-map';
import { CELL_STATES, type CellState, STATE_LETTERS, STATE_WORDS } from '@/lib/comb/states';
import type { Toggles } from '@/lib/offline/recorder-view';
import { markInHand } from './bench-acts';
import { BENCH_LETTERS } from './bench-keys';
import type { Bench } from './use-bench';

interface PadKeyProps {
  /** The key of the keyboard that does the same. */
  letter: string;
  pressed?: boolean;
  onPress: () => void;
  glyph?: ReactNode;
  children: string;
}

/** One key: for a finger, and showing which key of the keyboard does the same. */
function PadKey({ letter, pressed, onPress, glyph, children }: PadKeyProps): ReactElement {
  return (
    <button
      type="button"
      aria-pressed={pressed}
      onClick={onPress}
      className="flex min-h-12 min-w-0 touch-manipulation items-center gap-1.5 rounded lg:pointer-fine:min-h-9 border-2 border-ink bg-paper px-2 py-1 text-left leading-tight font-bold select-none hover:bg-wash aria-pressed:bg-main-wash aria-pressed:outline-2 aria-pressed:-outline-offset-1 aria-pressed:outline-main"
    >
      {glyph}
      <span className="min-w-0 grow">{children}</span>
      <kbd className="font-mono text-sm font-normal text-quiet">{letter}</kbd>
    </button>
  );
}

/** What a state is called on the bench: `unread` is what cannot be told. */
function padWord(state: CellState): string {
  return state === 'unread' ? 'cannot tell' : STATE_WORDS[state];
}

/** Everyday states first, what cannot be told last. */
const PAD_STATES: readonly CellState[] = [...CELL_STATES.filter((state) => state !== 'unread'), 'unread'];

const MARKS: readonly { name: keyof Toggles; letter: string; words: string }[] = [
  { name: 'nectar', letter: '’', words: 'nectar' },
  { name: 'unsure', letter: '?', words: 'unsure' },
  { name: 'reused', letter: BENCH_LETTERS.reused, words: 'reused' },
  { name: 'scrap', letter: BENCH_LETTERS.scrap, words: 'prey scrap' },
];

const INSTARS = [1, 2, 3, 4, 5] as const;

const PAD_GRID = 'grid grid-cols-2 gap-2 lg:pointer-fine:gap-1.5 sm:grid-cols-3 md:grid-cols-4 lg:grid-cols-2';

/** The states, with the letters of the paper sheet. */
function StateKeys({ bench }: { bench: Bench }): ReactElement {
  const chosen = markInHand(bench.recorder, bench.memory)?.state ?? null;
  return (
    <div role="group" aria-label="States" className={PAD_GRID}>
      {PAD_STATES.map((state) => (
        <PadKey
          key={state}
          letter={STATE_LETTERS[state]}
          pressed={state === chosen}
          onPress={() => bench.run({ do: 'mark', state })}
          glyph={<CellGlyph state={state} size={30} />}
        >
          {padWord(state)}
        </PadKey>
      ))}
    </div>
  );
}

/** The marks of the cell in hand, and its instar when it is a larva. */
function MarkKeys({ bench }: { bench: Bench }): ReactElement {
  const inHand = markInHand(bench.recorder, bench.memory);
  const toggles: Toggles = inHand ?? shownToggles(bench.recorder.view);
  return (
    <>
      <div role="group" aria-label="Marks" className={PAD_GRID}>
        {MARKS.map(({ name, letter, words }) => (
          <PadKey
            key={name}
            letter={letter}
            pressed={toggles[name]}
            onPress={() => bench.run({ do: 'toggle', mark: name })}
            glyph={<MarkGlyph mark={name} size={22} />}
          >
            {words}
          </PadKey>
        ))}
      </div>
      <div role="group" aria-label="Instar" className="flex flex-wrap items-center gap-2">
        <span className="font-bold">Instar</span>
        {INSTARS.map((instar) => (
          <button
            key={instar}
            type="button"
            aria-pressed={inHand?.instar === instar}
            onClick={() => bench.run({ do: 'instar', instar })}
            className="min-h-12 min-w-12 touch-manipulation lg:pointer-fine:min-h-9 rounded border-2 border-ink bg-paper font-mono font-bold hover:bg-wash aria-pressed:bg-ink aria-pressed:text-paper"
          >
            {instar}
          </button>
        ))}
      </div>
    </>
  );
}

/** Undo, redo, and that there is no cell here. */
function WayKeys({ bench }: { bench: Bench }): ReactElement {
  return (
    <div role="group" aria-label="Undo and walk" className={PAD_GRID}>
      <PadKey letter="⌫" onPress={() => bench.run({ do: 'undo' })}>
        Undo
      </PadKey>
      <PadKey letter="Ctrl Y" onPress={() => bench.run({ do: 'redo' })}>
        Redo
      </PadKey>
      <PadKey letter={NO_CELL_KEY} onPress={() => bench.run({ do: 'no-cell' })}>
        No cell here
      </PadKey>
      <PadKey letter={BENCH_LETTERS.finish} onPress={() => bench.run({ do: 'finish' })}>
        Finish
      </PadKey>
    </div>
  );
}

/** All keys of the bench. */
export function BenchPad({ bench }: { bench: Bench }): ReactElement {
  return (
    <div className="flex flex-col gap-3">
      <StateKeys bench={bench} />
      <MarkKeys bench={bench} />
      <WayKeys bench={bench} />
      <p className="text-sm text-quiet max-md:hidden">
        Arrows go to the cells beside, above and below; with Shift, up and down take the other one. <kbd>[</kbd>{' '}
        <kbd>]</kbd> <kbd>,</kbd> <kbd>.</kbd> go slanting. Marks and digits typed after a letter belong to that
        letter’s cell, as on the paper sheet.
      </p>
    </div>
  );
}
