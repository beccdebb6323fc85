import type { ReactElement } from 'react';
import { CELL_POINTS } from '@/components/comb/comb-symbols';
import { boxAround, placeOf, SYMBOL_BOX } from '@/components/comb/comb-view';
import { cellKey } from '@/lib/comb/axial';
import { cellNumber, cellsWithinRing, spiral } from '@/lib/comb/walk';

/** Rings on the sheet: 61 cells with the pedicel cell. */
export const SHEET_RINGS = 4;

/** Sixty-one empty cells with their numbers small at the lower edge, so that a letter fits above. */
export function SheetComb(): ReactElement {
  const cells = spiral(cellsWithinRing(SHEET_RINGS));
  const { x, y, width, height } = boxAround(cells);
  return (
    <svg
      role="img"
      aria-label="61 empty cells, numbered from 0 at the pedicel cell, ring after ring clockwise from 12"
      className="sheet-comb"
      viewBox={`${x} ${y} ${width} ${height}`}
    >
      {cells.map((cell) => {
        const at = placeOf(cell);
        return (
          <g key={cellKey(cell)} transform={`translate(${at.x} ${at.y})`}>
            <polygon
              points={CELL_POINTS}
              transform={`translate(${-SYMBOL_BOX / 2} ${-SYMBOL_BOX / 2})`}
              fill="none"
              stroke="currentColor"
              strokeWidth="1"
            />
            <text y="15" textAnchor="middle" fontSize="6" fill="currentColor">
              {cellNumber(cell)}
            </text>
          </g>
        );
      })}
      <circle cx="0" cy="-22" r="3.4" fill="currentColor" />
    </svg>
  );
}
