import type { Op } from './op';

/** What became of one pushed operation. */
export const PUSH_OUTCOMES = ['applied', 'duplicate', 'parked', 'quarantined', 'conflict', 'refused', 'retry'] as const;

/** One of `PUSH_OUTCOMES`. */
export type PushOutcome = (typeof PUSH_OUTCOMES)[number];

/** The outcomes after which the server holds the operation, so the phone may move it out of its queue. */
export const HELD_OUTCOMES: ReadonlySet<PushOutcome> = new Set([
  'applied',
  'duplicate',
  'parked',
  'quarantined',
  'conflict',
]);

/** The answer about one operation; results follow the order of the request. */
export interface PushResult {
  /** Echoes what came, whatever it was. */
  opId: unknown;
  r: PushOutcome;
  /** Server order; only for `applied` and `duplicate`. */
  seq?: number;
  /** Echoes what came, null if it was missing. */
  bodyHash: unknown;
  /** Why, for everything but `applied` and `duplicate`. */
  code?: string;
}

/** Body of `POST /api/sync/v1/push`. */
export interface PushRequest {
  protocol: number;
  schema: number;
  epoch: number;
  ops: Op[];
}

/** Answer of `POST /api/sync/v1/push`. */
export interface PushResponse {
  protocol: number;
  epoch: number;
  /** ISO 8601 UTC. */
  serverTime: string;
  /** Highest `seq` that is in the oldest backup a restore may use; phones keep acknowledged operations above it. */
  safeSeq: number;
  results: PushResult[];
}
