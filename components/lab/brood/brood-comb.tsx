'use client';

import { type ReactElement, useRef } from 'react';
import { FigureDownloads, type FigureFacts } from '@/components/charts/figure';
import { CombKey } from '@/components/comb/comb-key';
import type { CombCellView } from '@/components/comb/comb-view';
import type { CellLines } from '@/components/lab/cell-lines';
import { CombInspector } from '@/components/lab/comb-inspector';
import { AgeKey } from './age-key';

interface BroodCombProps {
  cells: readonly CombCellView[];
  label: string;
  cellSize: number;
  lines: CellLines;
  facts: FigureFacts;
}

/** The comb by the age of its brood: days in every cell, details on a press or with the arrow keys. */
export function BroodComb({ cells, label, cellSize, lines, facts }: BroodCombProps): ReactElement {
  const frame = useRef<HTMLDivElement>(null);
  return (
    <div ref={frame}>
      <CombInspector cells={cells} label={label} cellSize={cellSize} lines={lines} tells="its dates" />
      <FigureDownloads within={frame} facts={facts} />
      <AgeKey />
      <CombKey cells={cells} className="mt-3 border-t border-rule pt-3" />
    </div>
  );
}
