import type { ReactElement } from 'react';
import type { Axial } from '@/lib/comb/axial';
import { CombCell } from './comb-cell';
import { CombFrame } from './comb-frame';
import { CombOverlay } from './comb-overlay';
import {
  boxAround,
  cellsAcross,
  type CombCellView,
  hasPedicel,
  naturalLook,
  PITCH,
  rowsOf,
  SMALLEST_MARKED_CELL,
} from './comb-view';

interface CombPictureProps {
  cells: readonly CombCellView[];
  /** What the picture shows, for those who do not see it: the tally in words. */
  label: string;
  /** Width of one cell in CSS pixels when there is room for it. */
  cellSize?: number;
  differs?: readonly Axial[];
}

/** A comb to look at or print: no keyboard, no script. Marks are left out when cells are too small for them. */
export function CombPicture({ cells, label, cellSize = 40, differs }: CombPictureProps): ReactElement {
  const box = boxAround(cells);
  const scale = cellSize / PITCH;
  return (
    <CombFrame mirrored={false}>
      <svg
        role="img"
        aria-label={label}
        className={`mx-auto block ${naturalLook(cellsAcross(box))}`}
        width={Math.round(box.width * scale)}
        height={Math.round(box.height * scale)}
        viewBox={`${box.x} ${box.y} ${box.width} ${box.height}`}
      >
        {rowsOf(cells).map((row) =>
          row.map((cell) => (
            <CombCell
              key={`${cell.q},${cell.r}`}
              cell={cell}
              marks={cellSize >= SMALLEST_MARKED_CELL}
              mirrored={false}
            />
          )),
        )}
        <CombOverlay differs={differs} pedicel={hasPedicel(cells)} mirrored={false} />
      </svg>
    </CombFrame>
  );
}
