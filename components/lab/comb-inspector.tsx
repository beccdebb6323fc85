'use client';

import { type ReactElement, useState } from 'react';
import { CombDiagram } from '@/components/comb/comb-diagram';
import { cellName, type CombCellView } from '@/components/comb/comb-view';
import { sentence } from '@/components/ui/sentence';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellLines } from './cell-lines';

interface CombInspectorProps {
  cells: readonly CombCellView[];
  label: string;
  cellSize: number;
  lines: CellLines;
  /** What a press on a cell tells: `its dates`. */
  tells: string;
}

/** The comb of a reading: press a cell, or reach it with the arrow keys, to read its dates and note. */
export function CombInspector({ cells, label, cellSize, lines, tells }: CombInspectorProps): ReactElement {
  const [picked, setPicked] = useState<Axial | null>(null);
  const cell = picked && cells.find((candidate) => cellKey(candidate) === cellKey(picked));
  return (
    <div>
      <div className="overflow-x-auto print:overflow-visible">
        <CombDiagram
          cells={cells}
          label={label}
          cellSize={cellSize}
          current={picked}
          onCellPress={setPicked}
          onCellReach={setPicked}
        />
      </div>
      <div
        aria-live="polite"
        className="print-hidden mt-2 min-h-24 border-l-[6px] border-main bg-main-wash px-3 py-2 text-[0.9375rem]"
      >
        {cell ? (
          <>
            <p className="font-bold">{sentence(cellName(cell))}</p>
            {(lines[cellKey(cell)] ?? []).map((line) => (
              <p key={line} className="[overflow-wrap:anywhere]">
                {line}
              </p>
            ))}
          </>
        ) : (
          <p className="text-quiet">Press a cell, or walk the comb with the arrow keys, to read {tells}.</p>
        )}
      </div>
    </div>
  );
}
