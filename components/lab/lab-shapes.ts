import type { CellState } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';

/** One row of the nests list. Instants are ISO texts. */
export interface NestRow {
  id: string;
  code: string;
  name: string | null;
  taxon: string | null;
  openedAt: string;
  visits: number;
  lastVisitAt: string | null;
  /** Cells of the latest reading one may see; null before the first, and to a blind second reader. */
  cells: number | null;
  /** How far the work on it has come; see `NEST_STATE_WORDS`. */
  state: string;
}

/** A reading in the list of a visit. */
export interface ReadingRow {
  id: string;
  /** `field`, `second` or `final`. */
  kind: string;
  observer: string;
  openedAt: string;
  submittedAt: string | null;
  lockedVersion: number | null;
  /** Null while the person who asks must stay blind. */
  tally: Tally | null;
}

/** A visit with its readings. */
export interface VisitRow {
  id: string;
  purpose: string;
  startedAt: string;
  readings: readonly ReadingRow[];
}

/** A place, degrees in WGS 84. */
export interface PlaceView {
  lat: number;
  lon: number;
  accuracyM?: number | null;
}

/** One nest with its visits. */
export interface NestView {
  id: string;
  code: string;
  name: string | null;
  taxon: string | null;
  place: PlaceView | null;
  visits: readonly VisitRow[];
}

/** One cell of a reading as it stands. */
export interface MarkView {
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
  at: string | null;
}

/** One decision of a reviewer about one cell. */
export interface SettlementView {
  q: number;
  r: number;
  state: CellState;
  reason: string;
  actor: string;
  at: string;
  version: number;
}

/** One reading with its cells. */
export interface ReadingView {
  id: string;
  nest: string;
  visit: string;
  /** `field`, `second` or `final`. */
  kind: string;
  source: string;
  observer: string;
  openedAt: string;
  submittedAt: string | null;
  marks: readonly MarkView[];
  tally: Tally;
  lockedVersion: number | null;
}

/** The opening of a new version of a locked reading. */
export interface AmendmentView {
  /** The version it opened. */
  version: number;
  reason: string;
  actor: string;
  at: string;
}

/** What the lab decided about a reading. */
export interface ReviewView {
  /** The final reading; null before the first decision. */
  final: {
    id: string;
    /** The reading it was made from. */
    basedOn: string;
    version: number;
    /** The version last locked; the reading is locked when it equals `version`. */
    lockedVersion: number | null;
    /** Marks came to the source after the final reading was made from it. */
    stale: boolean;
  } | null;
  settlements: readonly SettlementView[];
  amendments: readonly AmendmentView[];
}
