import { memo, type ReactElement } from 'react';
import { cellKey } from '@/lib/comb/axial';
import { MARK_SYMBOLS, STATE_SYMBOLS } from './comb-symbols';
import { cellName, type CombCellView, placeOf, SYMBOL_BOX } from './comb-view';

/** How a cell sits in an interactive diagram: whether Tab reaches it, and whether it is the one picked. */
export interface CellSeat {
  tabbable: boolean;
  picked: boolean;
}

interface CombCellProps {
  cell: CombCellView;
  /** Draw the small marks too; false below 20 px a cell. */
  marks: boolean;
  mirrored: boolean;
  /** Left out in a picture that only shows. */
  seat?: CellSeat;
}

const MARKS = [
  'nectar',
  'unsure',
  'noted',
  'reused',
  'scrap',
  'changed',
] as const satisfies readonly (keyof typeof MARK_SYMBOLS)[];

/** Which of a cell's marks to draw: the lower right corner has room for one, so the reviewer's change wins there. */
function shownMarks(cell: CombCellView): (keyof typeof MARK_SYMBOLS)[] {
  const corner = (['changed', 'reused', 'scrap'] as const).find((mark) => cell[mark] === true);
  return MARKS.filter(
    (mark) => cell[mark] === true && (mark === corner || !['changed', 'reused', 'scrap'].includes(mark)),
  );
}

function CellDrawing({ cell, marks, mirrored, seat }: CombCellProps): ReactElement {
  const { x, y } = placeOf(cell, mirrored);
  const box = { x: x - SYMBOL_BOX / 2, y: y - SYMBOL_BOX / 2, width: SYMBOL_BOX, height: SYMBOL_BOX };
  const grid = seat && {
    role: 'gridcell',
    'aria-label': cellName(cell),
    'aria-selected': seat.picked,
    tabIndex: seat.tabbable ? 0 : -1,
  };
  return (
    <g
      className={`comb-cell cell-${cell.state}`}
      data-cell={cellKey(cell)}
      data-pending={cell.pending || undefined}
      {...grid}
    >
      <use href={`#${STATE_SYMBOLS[cell.state]}`} {...box} />
      {marks &&
        shownMarks(cell).map((mark) => (
          <use key={mark} className="comb-mark" href={`#${MARK_SYMBOLS[mark]}`} {...box} />
        ))}
    </g>
  );
}

const sameCell = (a: CombCellView, b: CombCellView): boolean =>
  a.q === b.q &&
  a.r === b.r &&
  a.state === b.state &&
  a.pending === b.pending &&
  MARKS.every((mark) => a[mark] === b[mark]);

const sameSeat = (a?: CellSeat, b?: CellSeat): boolean => a?.tabbable === b?.tabbable && a?.picked === b?.picked;

/** One cell of a comb: hexagon, glyph and marks. Drawn again only when something seen in it changes. */
export const CombCell = memo(
  CellDrawing,
  (a, b) => a.marks === b.marks && a.mirrored === b.mirrored && sameSeat(a.seat, b.seat) && sameCell(a.cell, b.cell),
);
