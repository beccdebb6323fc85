import { memo, type ReactElement } from 'react';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellSeat } from './comb-cell';
import { CELL_POINTS } from './comb-symbols';
import { ghostName, placeOf, SYMBOL_BOX } from './comb-view';

interface CombGhostProps {
  place: Axial;
  mirrored: boolean;
  seat: CellSeat;
}

function GhostDrawing({ place, mirrored, seat }: CombGhostProps): ReactElement {
  const { x, y } = placeOf(place, mirrored);
  return (
    <g
      className="comb-ghost"
      data-cell={cellKey(place)}
      data-ghost=""
      role="gridcell"
      aria-label={ghostName(place)}
      aria-selected={seat.picked}
      tabIndex={seat.tabbable ? 0 : -1}
      transform={`translate(${x - SYMBOL_BOX / 2} ${y - SYMBOL_BOX / 2})`}
    >
      <polygon className="comb-ghost-wall" points={CELL_POINTS} />
      <path className="comb-ghost-plus" d="M24 19v10M19 24h10" />
    </g>
  );
}

/** A free place on the rim where the comb may have grown: dashed, with a plus. */
export const CombGhost = memo(
  GhostDrawing,
  (a, b) =>
    cellKey(a.place) === cellKey(b.place) &&
    a.mirrored === b.mirrored &&
    a.seat.tabbable === b.seat.tabbable &&
    a.seat.picked === b.seat.picked,
);
