import 'server-only';
import type { OpFlag } from '@/lib/protocol/op-codes';
import type { Decision, Objection } from './decision';
import type { Submission } from './decide-op';

/** An operation on its way into the log: from the batch that is being pushed, or parked since an earlier one. */
export interface Candidate extends Submission {
  deviceId: string | null;
  /** Flags that were found by looking at the batch as a whole. */
  batchFlags: readonly OpFlag[];
  /** Told once, when it is clear what becomes of the operation. */
  conclude(outcome: Outcome): void;
}

/** A decision with the place in the log it led to. */
export type Outcome = Objection | (Extract<Decision, { r: 'applied' }> & { seq: number });
