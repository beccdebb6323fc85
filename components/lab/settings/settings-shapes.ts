import type { LearnedFactor } from '@/lib/brood/learning/duration-learning';
import type { LearnedRow } from '@/lib/brood/learning/confusion-learning';
import type { DurationRow } from '@/lib/brood/durations';
import type { DateShift } from '@/lib/brood/team-settings/date-shift';

/** A signed version by name, time and reason. Instants are ISO texts. */
export interface SignedView {
  version: number;
  signedBy: string | null;
  signedAt: string | null;
  reason: string | null;
}

/** How one nest's dates would move. */
export interface NestShiftView {
  id: string;
  code: string;
  founded: DateShift;
  firstEmergence: DateShift;
}

/** One part of what would move. */
export interface ImpactPart {
  nests: readonly NestShiftView[];
  looked: number;
  total: number;
  next: string | null;
}

/** What the team's own readings say. */
export interface LearningView {
  version: number;
  pseudoCount: number;
  confusion: readonly LearnedRow[];
  cells: number;
  durations: readonly (LearnedFactor & { row: DurationRow })[];
}
