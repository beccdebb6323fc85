'use client';

import type { ReactElement } from 'react';
import { tallyWords } from '@/components/comb/comb-view';
import { FieldButton } from '@/components/field/parts/field-button';
import { Sheet } from '@/components/field/parts/sheet';
import { countWords } from '@/components/ui/date-words';
import { cellKey } from '@/lib/comb/axial';
import { tallyOf } from '@/lib/comb/tally';
import type { Desk } from './desk';
import { stillExpected } from './expected-states';

interface ExpectedSheetProps {
  desk: Desk;
  /** Cells that were the current one while this reading was open, by `cellKey`. */
  looked: ReadonlySet<string>;
  open: boolean;
  onClose: () => void;
}

type Cells = ReturnType<typeof stillExpected>;

/** Counts of states in words, without nectar. */
function statesOf(cells: Cells): string {
  return tallyWords(tallyOf(cells.map(({ state }) => ({ state, nectar: false })))).join(', ');
}

function MarkKey({ cells, main, onPress, words }: { cells: Cells; main: boolean; onPress: () => void; words: string }) {
  return (
    <FieldButton tone={main ? 'main' : 'plain'} onClick={onPress} className="flex-col gap-0">
      <span>{words}</span>
      <span className="font-normal">{statesOf(cells)}</span>
    </FieldButton>
  );
}

function ExpectedBody({ desk, looked, onClose }: Omit<ExpectedSheetProps, 'open'>): ReactElement {
  const all = stillExpected(desk.recorder.view, desk.expected);
  const stepped = all.filter((cell) => looked.has(cellKey(cell)));
  const mark = (cells: Cells) => () => {
    desk.recorder.paintAll(cells);
    onClose();
  };
  if (all.length === 0) return <p>No cell is left that bears no mark and has something expected in it.</p>;
  const isPart = stepped.length > 0 && stepped.length < all.length;
  return (
    <div className="flex flex-col gap-gap">
      <p>
        Mark only cells you have looked into: what is expected is a guess from the last visit, your mark is what you
        saw.
      </p>
      {isPart && (
        <MarkKey
          main
          cells={stepped}
          onPress={mark(stepped)}
          words={`Mark the ${countWords(stepped.length, 'cell')} you stepped through`}
        />
      )}
      <MarkKey
        main={!isPart}
        cells={all}
        onPress={mark(all)}
        words={all.length === 1 ? 'Mark the last cell' : `Mark all ${all.length} cells left`}
      />
      <FieldButton onClick={onClose}>Mark none</FieldButton>
    </div>
  );
}

/** Marks the cells that are left with what was expected in them, with their number on the key. */
export function ExpectedSheet({ open, ...rest }: ExpectedSheetProps): ReactElement {
  return (
    <Sheet open={open} title="The rest as expected?" onClose={rest.onClose}>
      <ExpectedBody {...rest} />
    </Sheet>
  );
}
