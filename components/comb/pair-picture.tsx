import type { ReactElement } from 'react';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { CombCell } from './comb-cell';
import { CombFrame } from './comb-frame';
import { CombOverlay } from './comb-overlay';
import { CELL_POINTS, STATE_SYMBOLS } from './comb-symbols';
import { boxAround, cellsAcross, hasPedicel, naturalLook, PITCH, placeOf, SYMBOL_BOX } from './comb-view';

/** One cell as two readers saw it; null where a reader has no such cell. */
export interface PairCell extends Axial {
  field: CellState | null;
  lab: CellState | null;
}

interface PairPictureProps {
  pairs: readonly PairCell[];
  /** What the picture shows, for those who do not see it. */
  label: string;
  /** Width of one cell in CSS pixels when there is room for it. */
  cellSize?: number;
}

/** Side of a glyph drawn at half size, in drawing units: two of them fit between the walls of a cell. */
const HALF = 20;

function HalfGlyph({ state, x, y }: { state: CellState; x: number; y: number }): ReactElement {
  return (
    <g className={`comb-cell cell-${state}`}>
      <use href={`#${STATE_SYMBOLS[state]}`} x={x} y={y - HALF / 2} width={HALF} height={HALF} />
    </g>
  );
}

/** A cell two readers see differently: an empty wall around both glyphs, the field's left and the lab's right. */
function BothGlyphs({ pair }: { pair: PairCell }): ReactElement {
  const { x, y } = placeOf(pair);
  return (
    <g data-pair={cellKey(pair)}>
      <polygon
        points={CELL_POINTS}
        transform={`translate(${x - SYMBOL_BOX / 2} ${y - SYMBOL_BOX / 2})`}
        className="fill-paper stroke-ink"
        strokeWidth="1.4"
      />
      {pair.field && <HalfGlyph state={pair.field} x={x - HALF + 1.5} y={y} />}
      {pair.lab && <HalfGlyph state={pair.lab} x={x - 1.5} y={y} />}
    </g>
  );
}

function isAlike({ field, lab }: PairCell): boolean {
  return field !== null && field === lab;
}

/**
 * Two readings laid over each other: where they agree the cell is drawn once, where they do not its outline is doubled
 * and both glyphs stand in it at half size.
 */
export function PairPicture({ pairs, label, cellSize = 44 }: PairPictureProps): ReactElement {
  const box = boxAround(pairs);
  const scale = cellSize / PITCH;
  const differing = pairs.filter((pair) => !isAlike(pair));
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
        {pairs.filter(isAlike).map(({ q, r, field }) => (
          <CombCell key={cellKey({ q, r })} cell={{ q, r, state: field ?? 'unread' }} marks={false} mirrored={false} />
        ))}
        {differing.map((pair) => (
          <BothGlyphs key={cellKey(pair)} pair={pair} />
        ))}
        <CombOverlay differs={differing} pedicel={hasPedicel(pairs)} mirrored={false} />
      </svg>
    </CombFrame>
  );
}
