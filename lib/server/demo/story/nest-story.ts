import 'server-only';
import type { Axial } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { Json } from '@/lib/protocol/canonical-json';
import type { OpKind } from '@/lib/protocol/op';
import type { WallTime } from '@/lib/server/demo/build/demo-time';
import type { Person } from './person';
import type { ReadingStory } from './reading-story';

/** Something recorded on a visit or a nest besides cells: a step, a behaviour, a sting, a field, a note. */
export interface ActStory {
  at: WallTime;
  kind: OpKind;
  body: { [key: string]: Json };
  /** Who recorded it, when not the person who opened the visit. */
  by?: Person;
}

/** One dated look at a nest. */
export interface VisitStory {
  /** Names the visit within its nest. */
  key: string;
  purpose: 'take-down' | 'check' | 'lab' | 'other';
  by: Person;
  startedAt: WallTime;
  /** No earlier than this do its operations reach the office. */
  heldUntil?: WallTime;
  acts: readonly ActStory[];
  readings: readonly ReadingStory[];
}

/** One cell decided by the lab. */
export interface SettledCell extends Axial {
  state: CellState;
  reason: string;
}

/** One step of the lab's work on a reading; `leaves` is the final reading's version and lock afterwards. */
export interface DecisionStory {
  by: Person;
  at: WallTime;
  /** The reading that is settled: keys of its visit and of itself. */
  visit: string;
  reading: string;
  leaves: { version: number; lockedVersion: number | null };
  act: { kind: 'settle'; cells: readonly SettledCell[] } | { kind: 'lock' } | { kind: 'amend'; reason: string };
}

/** The agreed end state of a nest's job. */
export interface OutcomeStory {
  outcome: string;
  /** `YYYY-MM-DD`, local. */
  decidedOn: string;
  note: string;
}

/** A place in degrees WGS 84; all of them lie in open water. */
export interface PlaceStory {
  lat: number;
  lon: number;
  accuracyM: number;
}

/** One nest from the call to its outcome. */
export interface NestStory {
  code: string;
  /** The name its ids are made from, when not its own code: a nest of another team then has the very same ids. */
  idName?: string;
  name: string;
  taxon: string;
  place: PlaceStory | null;
  openedBy: Person;
  openedAt: WallTime;
  /** Recorded on the nest itself, after it was opened. */
  acts: readonly ActStory[];
  visits: readonly VisitStory[];
  decisions: readonly DecisionStory[];
  outcome: OutcomeStory | null;
}
