'use client';

import { type KeyboardEvent, type MouseEvent, type ReactElement, useRef } from 'react';
import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import { CombCell } from './comb-cell';
import { CombFrame } from './comb-frame';
import { CombGhost } from './comb-ghost';
import { CombOverlay } from './comb-overlay';
import { isStepKey, stepFrom } from './comb-steps';
import {
  boxAround,
  boxOfWindow,
  cellsAcross,
  type CombCellView,
  type CombWindow,
  hasPedicel,
  naturalLook,
  PITCH,
  type PlaceKind,
  rowsOf,
  SMALLEST_MARKED_CELL,
} from './comb-view';
import { useRovingCell } from './use-roving-cell';

/** Everything the interactive comb takes. Only `cells` and `label` are needed. */
export interface CombDiagramProps {
  cells: readonly CombCellView[];
  /** The grid's name, such as `Comb of N12, 33 cells`. */
  label: string;
  /** Free places on the rim, drawn dashed with a plus; a press on one asks to add it. */
  ghosts?: readonly Axial[];
  /** The cell the person works on: a thick outline around it. May be a ghost place. */
  current?: Axial | null;
  /** A finger, the mouse, Enter or Space pressed a place; it acts on release inside it. */
  onCellPress?: (place: Axial, kind: PlaceKind) => void;
  /** The keyboard moved to a place with an arrow key, Home, End, PageUp or PageDown. */
  onCellReach?: (place: Axial, kind: PlaceKind) => void;
  /** Cells in which two readings differ: outline doubled. */
  differs?: readonly Axial[];
  /** Show only this part, large; the whole comb when left out. Keep it in state with `followWindow`. */
  viewWindow?: CombWindow;
  /** Width of one cell in CSS pixels when the diagram has its natural size. */
  cellSize?: number;
  /** `natural` takes the size of its cells (and shrinks to the page); `fill` fills the box around it. */
  sizing?: 'natural' | 'fill';
  /** Seen from above instead of from below; the label says so. */
  mirrored?: boolean;
  className?: string;
}

const placeKind = (element: Element): PlaceKind => (element.hasAttribute('data-ghost') ? 'ghost' : 'cell');

/** The element of a place around an event's target, or null beside all places. */
function placeElement(target: EventTarget): Element | null {
  return target instanceof Element ? target.closest('[data-cell]') : null;
}

/** The address an element stands for. */
function addressOf(element: Element): Axial {
  return parseCellKey(element.getAttribute('data-cell') ?? '0,0');
}

type Handlers = Pick<CombDiagramProps, 'onCellPress' | 'onCellReach'>;

/** One set of handlers for the whole grid, so that a comb of 500 cells carries none of its own. */
function useGridHandlers(
  places: readonly Axial[],
  moveTo: (place: Axial) => void,
  { onCellPress, onCellReach }: Handlers,
) {
  const grid = useRef<SVGSVGElement>(null);
  const press = (element: Element): void => {
    moveTo(addressOf(element));
    onCellPress?.(addressOf(element), placeKind(element));
  };
  const onClick = (event: MouseEvent): void => {
    const element = placeElement(event.target);
    if (element) press(element);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    const element = placeElement(event.target);
    if (!element || event.ctrlKey || event.metaKey || event.altKey) return;
    const { key, shiftKey } = event;
    if (key === 'Enter' || key === ' ') press(element);
    else if (isStepKey(key)) reach(stepFrom(addressOf(element), { key, shift: shiftKey }, places));
    else return;
    event.preventDefault();
  };
  const reach = (place: Axial): void => {
    moveTo(place);
    const element = grid.current?.querySelector<SVGGElement>(`[data-cell="${cellKey(place)}"]`);
    if (!element) return;
    element.focus();
    onCellReach?.(place, placeKind(element));
  };
  return { grid, onClick, onKeyDown };
}

/** The drawing's box and its size on the page; filling a box leaves the size to the page. */
function layoutOf(places: readonly Axial[], { viewWindow, mirrored, cellSize = 44, sizing }: CombDiagramProps) {
  const box = viewWindow ? boxOfWindow(viewWindow, mirrored) : boxAround(places, mirrored);
  const scale = cellSize / PITCH;
  const natural = { width: Math.round(box.width * scale), height: Math.round(box.height * scale) };
  return {
    viewBox: `${box.x} ${box.y} ${box.width} ${box.height}`,
    size: sizing === 'fill' ? {} : natural,
    across: cellsAcross(box),
  };
}

/**
 * The comb as a grid one can press and walk with the keyboard: arrows reach the six neighbours, Home and End the ends
 * of the walk, Enter and Space press. One Tab stop for the whole comb; every cell has a spoken name.
 */
export function CombDiagram(props: CombDiagramProps): ReactElement {
  const {
    cells,
    label,
    ghosts = [],
    current = null,
    differs,
    mirrored = false,
    cellSize = 44,
    sizing = 'natural',
  } = props;
  const places: Axial[] = [...cells, ...ghosts];
  const { place: stop, moveTo } = useRovingCell(places, current);
  const { grid, onClick, onKeyDown } = useGridHandlers(places, moveTo, props);
  const { viewBox, size, across } = layoutOf(places, props);
  const [stopKey, currentKey] = [stop && cellKey(stop), current && cellKey(current)];
  const seatOf = (key: string) => ({ tabbable: key === stopKey, picked: key === currentKey });
  const known = new Map(cells.map((cell) => [cellKey(cell), cell]));
  return (
    <CombFrame mirrored={mirrored} className={props.className}>
      <svg
        ref={grid}
        role="grid"
        aria-label={label}
        className={`comb-grid mx-auto block ${sizing === 'fill' ? 'h-full w-full' : naturalLook(across)}`}
        viewBox={viewBox}
        onClick={onClick}
        onKeyDown={onKeyDown}
        {...size}
      >
        {rowsOf(places).map((row) => (
          <g key={row[0]?.r} role="row">
            {row.map((place) => {
              const key = cellKey(place);
              const [cell, seat] = [known.get(key), seatOf(key)];
              return cell ? (
                <CombCell
                  key={key}
                  cell={cell}
                  marks={cellSize >= SMALLEST_MARKED_CELL}
                  mirrored={mirrored}
                  seat={seat}
                />
              ) : (
                <CombGhost key={key} place={place} mirrored={mirrored} seat={seat} />
              );
            })}
          </g>
        ))}
        <CombOverlay
          current={current}
          focused={stop}
          differs={differs}
          pedicel={hasPedicel(cells)}
          mirrored={mirrored}
        />
      </svg>
    </CombFrame>
  );
}
