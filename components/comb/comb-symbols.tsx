import type { ReactElement, ReactNode } from 'react';
import type { CellState } from '@/lib/comb/states';

/** The symbol of each state. */
export const STATE_SYMBOLS: Readonly<Record<CellState, string>> = {
  unread: 'st-unread',
  empty: 'st-empty',
  egg: 'st-egg',
  small: 'st-larva-s',
  medium: 'st-larva-m',
  large: 'st-larva-l',
  capped: 'st-capped',
  opened: 'st-opened',
  dead: 'st-dead',
  parasitised: 'st-parasite',
  webbed: 'st-webbed',
  damaged: 'st-damaged',
};

/** The symbols of the small marks that can stand with any state. */
export const MARK_SYMBOLS = {
  nectar: 'mk-nectar',
  unsure: 'mk-unsure',
  reused: 'mk-reused',
  scrap: 'mk-scrap',
  noted: 'mk-note',
  changed: 'mk-changed',
} as const;

/** Corners of a cell in the symbols' box of 48. */
export const CELL_POINTS = '24,2 43,13 43,35 24,46 5,35 5,13';

const INNER_POINTS = '24,11 35.3,17.5 35.3,30.5 24,37 12.7,30.5 12.7,17.5';

/** The wall of a cell: its fill is decoration (`--cell`), its outline may differ from the glyph (`--outline`). */
function Wall(): ReactElement {
  return <polygon points={CELL_POINTS} fill="var(--cell,#fff)" stroke="var(--outline,currentColor)" strokeWidth="2" />;
}

function Symbol({ id, wall = true, children }: { id: string; wall?: boolean; children?: ReactNode }): ReactElement {
  return (
    <symbol id={id} viewBox="0 0 48 48">
      {wall && <Wall />}
      {children}
    </symbol>
  );
}

const line = { fill: 'none', stroke: 'currentColor', strokeLinecap: 'round' } as const;

/** Brood from egg to opened cap: the fuller the glyph, the older the brood. */
function BroodSymbols(): ReactElement {
  return (
    <>
      <Symbol id="st-egg">
        <path d="M20 29L9.5 34.8" stroke="currentColor" strokeWidth="2.6" />
        <ellipse cx="22" cy="25" rx="4.6" ry="8.2" fill="currentColor" transform="rotate(35 22 25)" />
      </Symbol>
      <Symbol id="st-larva-s">
        <path d="M28.5 19a6.6 6.6 0 1 0 0 10" {...line} strokeWidth="3.4" />
      </Symbol>
      <Symbol id="st-larva-m">
        <path d="M30.5 17a9.5 9.5 0 1 0 0 14" {...line} strokeWidth="3.8" />
        <circle cx="27" cy="24" r="3.4" fill="currentColor" />
      </Symbol>
      <Symbol id="st-larva-l">
        <circle cx="24" cy="24" r="13" fill="none" stroke="currentColor" strokeWidth="4" />
        <circle cx="24" cy="24" r="6" fill="currentColor" />
      </Symbol>
      <Symbol id="st-capped">
        <polygon points={INNER_POINTS} fill="currentColor" />
      </Symbol>
      <Symbol id="st-opened">
        <polygon points={INNER_POINTS} fill="var(--halo,#fff)" stroke="currentColor" strokeWidth="2.6" />
        <path d="M12.7 24l5.6 4 5.7-5 5.7 5 5.6-4V30.5L24 37 12.7 30.5z" fill="currentColor" />
      </Symbol>
    </>
  );
}

/** Cells without living brood. */
function OtherStateSymbols(): ReactElement {
  return (
    <>
      <Symbol id="st-unread" wall={false}>
        <polygon
          points={CELL_POINTS}
          fill="var(--cell,none)"
          stroke="var(--outline,currentColor)"
          strokeWidth="1.6"
          strokeDasharray="3 3"
        />
      </Symbol>
      <Symbol id="st-empty">
        <path d="M17 24h14" {...line} strokeWidth="3.2" />
      </Symbol>
      <Symbol id="st-dead">
        <path d="M15 15l18 18M33 15L15 33" {...line} strokeWidth="4" />
      </Symbol>
      <Symbol id="st-parasite">
        <path d="M24 13.5L35 32.5H13z" fill="none" stroke="currentColor" strokeWidth="3" />
        <circle cx="24" cy="26.5" r="2.6" fill="currentColor" />
      </Symbol>
      <Symbol id="st-webbed">
        <path d="M24 12v24M13.6 18l20.8 12M34.4 18L13.6 30" stroke="currentColor" strokeWidth="2.6" />
      </Symbol>
      <Symbol id="st-damaged">
        <path d="M25 11l-7 12h8l-5 14" {...line} strokeWidth="3.2" strokeLinejoin="round" />
      </Symbol>
    </>
  );
}

/** Small marks in the corners of a cell, each with a white halo so that it stands on any fill. */
function MarkSymbols(): ReactElement {
  const halo = { fill: 'currentColor', stroke: 'var(--halo,#fff)', paintOrder: 'stroke' } as const;
  return (
    <>
      <Symbol id="mk-nectar" wall={false}>
        <path d="M34 8.2c3 3.8 4.5 6 4.5 8.2a4.5 4.5 0 0 1-9 0c0-2.2 1.5-4.4 4.5-8.2z" {...halo} strokeWidth="2" />
      </Symbol>
      <Symbol id="mk-unsure" wall={false}>
        <circle cx="14.5" cy="14.5" r="5.6" fill="var(--halo,#fff)" stroke="var(--halo,#fff)" strokeWidth="5" />
        <circle cx="14.5" cy="14.5" r="5.6" fill="var(--halo,#fff)" stroke="currentColor" strokeWidth="1.6" />
        <path d="M12.6 13.4a2 2 0 1 1 2.5 2v1M15.1 17.6v.4" {...line} strokeWidth="1.5" />
      </Symbol>
      <Symbol id="mk-changed" wall={false}>
        <path d="M28.6 38l4.6-7.6L37.8 38z" {...halo} strokeWidth="2.4" />
      </Symbol>
      <Symbol id="mk-note" wall={false}>
        <rect
          x="10.6"
          y="30.4"
          width="7.4"
          height="7.4"
          fill="var(--halo,#fff)"
          stroke="var(--halo,#fff)"
          strokeWidth="4.6"
        />
        <rect
          x="10.6"
          y="30.4"
          width="7.4"
          height="7.4"
          fill="var(--halo,#fff)"
          stroke="currentColor"
          strokeWidth="1.9"
        />
      </Symbol>
      <Symbol id="mk-reused" wall={false}>
        <path d="M28.5 37a5 5 0 1 0 1-6.6" fill="none" stroke="var(--halo,#fff)" strokeWidth="5" />
        <path d="M28.5 37a5 5 0 1 0 1-6.6" fill="none" stroke="currentColor" strokeWidth="2" />
        <path d="M27 27.6l2.2 4.2 3.6-2.8z" fill="currentColor" />
      </Symbol>
      <Symbol id="mk-scrap" wall={false}>
        <path d="M33 31h7v7h-7z" transform="rotate(45 36.5 34.5)" {...halo} strokeWidth="2" />
      </Symbol>
    </>
  );
}

/** The symbol set, once in every page: combs, keys and legends point into it. */
export function CombSymbols(): ReactElement {
  return (
    <svg className="absolute" width="0" height="0" aria-hidden="true" focusable="false">
      <OtherStateSymbols />
      <BroodSymbols />
      <MarkSymbols />
    </svg>
  );
}
