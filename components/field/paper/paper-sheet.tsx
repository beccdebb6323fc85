import type { ReactElement, ReactNode } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { Mark } from '@/components/shell/mark';
import { CELL_STATES, type CellState, STATE_LETTERS, STATE_WORDS } from '@/lib/comb/states';
import { QrCode } from './qr-code';
import { SheetComb } from './sheet-comb';

interface PaperSheetProps {
  /** Printed in letters and as a square code; null on a sheet for a nest that has none yet. */
  code: string | null;
  /** What the nest is called on its label, when it is known here. */
  nest: string | null;
}

/** Marks that nobody can mistake for another on paper; `unread` is a blank cell. */
const LETTER_ON_PAPER: Readonly<Record<CellState, string>> = { ...STATE_LETTERS, empty: '–', unread: 'blank' };

/** A line to write on. */
function Blank({
  label,
  wide = false,
  children,
}: {
  label: string;
  wide?: boolean;
  children?: ReactNode;
}): ReactElement {
  return (
    <p className={`flex items-end gap-1 ${wide ? 'col-span-2' : ''}`}>
      <span className="shrink-0">{label}</span>
      <span className="min-w-0 flex-1 border-b border-ink font-bold">{children ?? '\u00a0'}</span>
    </p>
  );
}

function Head({ code, nest }: PaperSheetProps): ReactElement {
  return (
    <div className="flex items-start justify-between gap-4">
      <div className="min-w-0 flex-1">
        <p className="flex items-center gap-2 text-lg font-bold">
          <Mark size={22} /> Undereave field sheet
        </p>
        <div className="mt-1 grid grid-cols-2 gap-x-4 gap-y-1">
          <Blank label="Nest">{nest}</Blank>
          <Blank label="Date, time" />
          <Blank label="Reader" />
          <Blank label="Cells counted" />
          <Blank label="Light, lens" wide />
        </div>
      </div>
      {code && (
        <div className="text-center leading-none">
          <QrCode text={code} sizeMm={28} />
          <p className="font-mono font-bold">{code}</p>
        </div>
      )}
    </div>
  );
}

/** Symbol, letter and word of each state, and the two signs that follow a letter. */
function Letters(): ReactElement {
  return (
    <ul aria-label="Letters" className="sheet-letters">
      {CELL_STATES.map((state) => (
        <li key={state}>
          <CellGlyph state={state} size={16} />
          <b className="font-mono">{LETTER_ON_PAPER[state]}</b> {STATE_WORDS[state]}
        </li>
      ))}
      <li>
        <b className="font-mono">’</b> behind it: nectar
      </li>
      <li>
        <b className="font-mono">?</b> behind it: unsure
      </li>
    </ul>
  );
}

const CHECKS = ['dawn', 'day 1', 'day 2', 'day 3', 'day 7', 'day 14'] as const;

/** A line a check, for the days after the nest was set up. */
function CheckTable(): ReactElement {
  return (
    <table className="sheet-table">
      <caption className="sr-only">Checks</caption>
      <thead>
        <tr>
          <th scope="col">Check</th>
          <th scope="col">Date, time</th>
          <th scope="col">On comb</th>
          <th scope="col">Loads</th>
          <th scope="col">What was seen</th>
          <th scope="col">By</th>
        </tr>
      </thead>
      <tbody>
        {CHECKS.map((check) => (
          <tr key={check}>
            <th scope="row">{check}</th>
            {[1, 2, 3, 4, 5].map((column) => (
              <td key={column} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function StingBox(): ReactElement {
  return (
    <div className="border-2 border-ink p-1.5">
      <p>
        <strong>Somebody was stung.</strong> Move away from the nest. Trouble breathing, swelling away from the sting,
        hives, faintness or vomiting: call the emergency number now. The person’s own plan and local medical direction
        come first.
      </p>
      <div className="mt-1 grid grid-cols-4 gap-x-3">
        <Blank label="Who" />
        <Blank label="When" />
        <Blank label="Where on body" />
        <Blank label="Signs" />
      </div>
    </div>
  );
}

/** The blank sheet for a day without a phone: one page of A4 or Letter, black on white. */
export function PaperSheet(props: PaperSheetProps): ReactElement {
  return (
    <article aria-label="Paper field sheet" className="paper-sheet">
      <Head {...props} />
      <p className="mt-1 flex justify-between">
        <span>From below, cells facing you. Letter above, number below.</span>
        <span>Draw a line round the cells that are there: blank inside it is unread.</span>
      </p>
      <p className="text-center leading-none font-bold">▲ 12, the mark on the backing</p>
      <SheetComb />
      <Letters />
      <CheckTable />
      <StingBox />
    </article>
  );
}
