import { memo, type ReactElement } from 'react';
import { cellKey } from '@/lib/comb/axial';
import { CELL_POINTS, MARK_SYMBOLS, STATE_SYMBOLS } from './comb-symbols';
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

/** The square a symbol is drawn in. */
interface Placed {
  x: number;
  y: number;
  width: number;
  height: number;
}

const AGE_BAND_DAYS = 7;
const OLDEST_BAND = 6;

/** The colour band of an age: one a week, the last one open. */
export function ageBand(days: number): number {
  return Math.max(0, Math.min(OLDEST_BAND, Math.floor(days / AGE_BAND_DAYS)));
}

function classOf({ state, expected, ageDays }: CombCellView): string {
  if (expected) return 'comb-cell cell-unread';
  return ageDays === undefined ? `comb-cell cell-${state}` : `comb-cell age-${ageBand(ageDays)}`;
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

/** What the estimate expects in a cell without a mark: a dashed wall and a faint glyph. */
function ExpectedDrawing({ state, box }: { state: CombCellView['state']; box: Placed }): ReactElement {
  return (
    <>
      <use href={`#${STATE_SYMBOLS.unread}`} {...box} />
      <use className="comb-expected-glyph" href={`#${STATE_SYMBOLS[state]}`} {...box} />
    </>
  );
}

/** A cell coloured by the age of its brood: the glyph above, the days below. */
function AgedDrawing({ cell, box }: { cell: CombCellView; box: Placed }): ReactElement {
  const { x, y, width } = box;
  return (
    <>
      <polygon className="comb-wall" points={CELL_POINTS} transform={`translate(${x} ${y})`} />
      <svg x={x + width * 0.22} y={y + 4} width={width * 0.56} height={width * 0.56} viewBox="0 0 48 48">
        <use className="comb-bare" href={`#${STATE_SYMBOLS[cell.state]}`} width="48" height="48" />
      </svg>
      <text className="comb-age fig-mono" x={x + width / 2} y={y + 37.5} textAnchor="middle" fontSize="12.5">
        {cell.ageDays}
      </text>
    </>
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
    <g className={classOf(cell)} data-cell={cellKey(cell)} data-pending={cell.pending || undefined} {...grid}>
      <CellBody cell={cell} box={box} aged={marks} />
      {marks &&
        shownMarks(cell).map((mark) => (
          <use key={mark} className="comb-mark" href={`#${MARK_SYMBOLS[mark]}`} {...box} />
        ))}
    </g>
  );
}

function CellBody({ cell, box, aged }: { cell: CombCellView; box: Placed; aged: boolean }): ReactElement {
  if (cell.expected) return <ExpectedDrawing state={cell.state} box={box} />;
  if (cell.ageDays !== undefined && aged) return <AgedDrawing cell={cell} box={box} />;
  return <use href={`#${STATE_SYMBOLS[cell.state]}`} {...box} />;
}

const sameCell = (a: CombCellView, b: CombCellView): boolean =>
  a.q === b.q &&
  a.r === b.r &&
  a.state === b.state &&
  a.pending === b.pending &&
  a.expected === b.expected &&
  a.ageDays === b.ageDays &&
  MARKS.every((mark) => a[mark] === b[mark]);

const sameSeat = (a?: CellSeat, b?: CellSeat): boolean => a?.tabbable === b?.tabbable && a?.picked === b?.picked;

/** One cell of a comb: hexagon, glyph and marks. Drawn again only when something seen in it changes. */
export const CombCell = memo(
  CellDrawing,
  (a, b) => a.marks === b.marks && a.mirrored === b.mirrored && sameSeat(a.seat, b.seat) && sameCell(a.cell, b.cell),
);
