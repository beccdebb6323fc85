import type { ReactElement } from 'react';
import { type Axial, cellKey } from '@/lib/comb/axial';
import { CELL_POINTS } from './comb-symbols';
import { placeOf, SYMBOL_BOX } from './comb-view';

interface OutlineProps {
  place: Axial;
  className: string;
  grow?: number;
  mirrored: boolean;
}

/** The outline of a place moved to where it lies; `grow` widens it around its centre. */
function Outline({ place, className, grow = 1, mirrored }: OutlineProps): ReactElement {
  const { x, y } = placeOf(place, mirrored);
  const half = (SYMBOL_BOX / 2) * grow;
  return (
    <polygon
      className={className}
      points={CELL_POINTS}
      transform={`translate(${x - half} ${y - half}) scale(${grow})`}
    />
  );
}

interface CombOverlayProps {
  current?: Axial | null;
  /** The place the keyboard stands on; its ring shows only while the diagram has visible focus. */
  focused?: Axial | null;
  /** Cells in which two readings differ: their outline is doubled, not recoloured. */
  differs?: readonly Axial[];
  /** Is the pedicel cell among those drawn? Then its nub is too. */
  pedicel: boolean;
  mirrored: boolean;
}

/** What is drawn over all cells: doubled outlines, the pedicel's nub, the current cell and the keyboard's place. */
export function CombOverlay({ current, focused, differs = [], pedicel, mirrored }: CombOverlayProps): ReactElement {
  return (
    <g aria-hidden="true" pointerEvents="none">
      {differs.map((place) => (
        <g key={cellKey(place)}>
          <Outline place={place} className="comb-differs-gap" grow={0.84} mirrored={mirrored} />
          <Outline place={place} className="comb-differs-line" grow={0.84} mirrored={mirrored} />
        </g>
      ))}
      {pedicel && <circle className="comb-nub" cx="0" cy="-22" r="4.2" />}
      {current && <Outline place={current} className="comb-current" mirrored={mirrored} />}
      {focused && <Outline place={focused} className="comb-focus" grow={1.08} mirrored={mirrored} />}
    </g>
  );
}
