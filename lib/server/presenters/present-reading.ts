import 'server-only';
import type { ReadCell } from '@/lib/comb/final-cells';
import { type Tally, tallyOf } from '@/lib/comb/tally';
import { cellNumber } from '@/lib/comb/walk';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import { instantText } from './instant-text';

/** One reading of a visit, as `GET /api/nests/<id>` lists it. */
export interface ReadingSummary {
  id: string;
  kind: string;
  observer: string;
  openedAt: string;
  submittedAt: string | null;
  lockedVersion: number | null;
  /** Null while the person who asks must not see it. */
  tally: Tally | null;
}

/** One cell of a reading, as `GET /api/readings/<id>` lists it. */
export interface MarkAnswer {
  cell: number;
  q: number;
  r: number;
  state: string;
  instar: number | null;
  nectar: boolean;
  unsure: boolean;
  reused: boolean;
  scrap: boolean;
  note: string | null;
  /** Null for a cell that a reviewer added. */
  opId: string | null;
  at: string | null;
}

/** Answer of `GET /api/readings/<id>`. */
export interface ReadingAnswer {
  id: string;
  nest: string;
  visit: string;
  kind: string;
  source: string;
  observer: string;
  openedAt: string;
  submittedAt: string | null;
  marks: MarkAnswer[];
  tally: Tally;
  lockedVersion: number | null;
}

/** What a reading row does not say itself. */
export interface ReadingFacts {
  observer: string;
  /** Of the final reading, which its source reports too. */
  lockedVersion: number | null;
}

function presentMark({ q, r, state, instar, nectar, unsure, reused, scrap, note, opId, at }: ReadCell): MarkAnswer {
  return { cell: cellNumber({ q, r }), q, r, state, instar, nectar, unsure, reused, scrap, note, opId, at };
}

/** A reading within its visit. @param cells null when they must not be shown. */
export function presentReadingSummary(
  row: ReadingRow,
  facts: ReadingFacts,
  cells: readonly ReadCell[] | null,
): ReadingSummary {
  return {
    id: fromBinary(row.id),
    kind: row.kind,
    observer: facts.observer,
    openedAt: instantText(row.opened_at_text, row.opened_at),
    submittedAt: row.submitted_at?.toISOString() ?? null,
    lockedVersion: facts.lockedVersion,
    tally: cells && tallyOf(cells),
  };
}

/** A whole reading. */
export function presentReading(row: ReadingRow, facts: ReadingFacts, cells: readonly ReadCell[]): ReadingAnswer {
  return {
    id: fromBinary(row.id),
    nest: fromBinary(row.nest_id),
    visit: fromBinary(row.visit_id),
    kind: row.kind,
    source: row.source,
    observer: facts.observer,
    openedAt: instantText(row.opened_at_text, row.opened_at),
    submittedAt: row.submitted_at?.toISOString() ?? null,
    marks: cells.map(presentMark),
    tally: tallyOf(cells),
    lockedVersion: facts.lockedVersion,
  };
}
