import type { CombAgreement, Settler } from '@/lib/comb/agreement';
import type { CellPair, Seen } from '@/lib/comb/compare-cells';
import type { MarkContent } from '@/lib/comb/mark';
import type { SettlePick } from '@/lib/comb/settle-pick';
import type { SettleSuggestion } from '@/lib/comb/settle-suggestion';
import type { CellState } from '@/lib/comb/states';
import type { LayingDifference, NestDates } from '@/lib/brood/laying-difference';
import type { ReadingAgreement } from '@/lib/stats/agreement-of';

/** What one reader saw in a cell. */
export type SeenView = Seen;

/** One visit of the queue. */
export interface QueueRow {
  visit: string;
  nest: string;
  code: string;
  name: string | null;
  purpose: string;
  startedAt: string;
  submittedAt: string;
  waitsFor: 'second' | 'reading' | 'reviewer' | 'lead' | 'lock' | 'later-marks';
  reader: string | null;
  mine: boolean;
  own: boolean;
  toChoose: number;
  overdue: boolean;
}

/** How much one person of the lab has in hand, and has done. */
export interface ReaderRow {
  name: string;
  reading: number;
  read: number;
  locked: number;
}

/** A decision that stands in one cell. */
export interface SettledCellView {
  state: CellState;
  pick: SettlePick | null;
  reason: string;
  actor: string;
  at: string;
}

/** One cell as both readers saw it, what is proposed, and what was decided. */
export interface PairRow extends CellPair {
  suggestion: SettleSuggestion | null;
  settled: SettledCellView | null;
}

/** Two readings compared. */
export interface ComparedView {
  field: readonly MarkContent[];
  lab: readonly MarkContent[];
  pairs: readonly PairRow[];
  agreement: CombAgreement;
  figures: ReadingAgreement<CellState>;
  settler: Settler;
  dates: LayingDifference & { field: NestDates; lab: NestDates };
  open: number;
}

/** One reading of the visit, without its cells. */
export interface VisitReadingView {
  id: string;
  observer: string;
  source: string;
  openedAt: string;
  submittedAt: string;
}

/** One locked version. */
export interface LockView {
  version: number;
  hash: string;
  settingsVersion: number;
  field: string;
  second: string | null;
  settled: readonly string[];
  lockedBy: string;
  at: string;
}

/** Where the final reading stands. */
export interface FinalStandingView {
  id: string;
  version: number;
  lockedVersion: number | null;
  stale: boolean;
  decisions: number;
  locks: readonly LockView[];
}
