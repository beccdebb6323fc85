'use client';

import type { ReactElement } from 'react';
import { CombDiagram } from '@/components/comb/comb-diagram';
import { combPart } from '@/components/field/recorder/comb-part';
import type { Bench } from './use-bench';

interface BenchCombProps {
  bench: Bench;
  title: string;
}

/** From this many cells on, the corner marks would blur. */
const SMALL_FROM = 150;

/** A cell whose press is not known to be kept has a dashed wall, as bold as any other. */
const PENDING = '[&_[data-pending]]:opacity-100 [&_[data-pending]>use:first-child]:[stroke-dasharray:3.5_3]';

/** The whole comb as read so far, with the free places around it. */
export function BenchComb({ bench, title }: BenchCombProps): ReactElement {
  const { view } = bench.recorder;
  const { cells, ghosts } = combPart(view, null);
  return (
    <div className="relative h-[46dvh] min-h-64 rounded border border-rule lg:h-[calc(100dvh-15rem)]">
      <div className="absolute inset-2">
        <CombDiagram
          cells={cells}
          ghosts={ghosts}
          label={`Comb of ${title}, ${view.tally.cellsTotal} cells marked`}
          current={view.current}
          onCellPress={bench.go}
          onCellReach={bench.go}
          cellSize={cells.length >= SMALL_FROM ? 16 : 44}
          sizing="fill"
          className={`h-full ${PENDING}`}
        />
      </div>
    </div>
  );
}
