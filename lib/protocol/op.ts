import type { Json } from './canonical-json';

/** Every kind of operation this version knows; all are `kindV` 1. */
export const OP_KINDS = [
  'nest.open',
  'visit.open',
  'reading.open',
  'cell.mark',
  'cell.retract',
  'reading.submit',
  'field.set',
  'note.set',
  'step.mark',
  'behaviour.add',
  'sting.add',
  'photo.attach',
  'photo.detach',
  'entity.archive',
] as const;

/** The name of what an operation does. */
export type OpKind = (typeof OP_KINDS)[number];

/** When an operation was made, by every clock the phone has. */
export interface OpTime {
  /** Wall time with offset, ISO 8601, as the phone showed it. */
  wall: string;
  /** Monotonic milliseconds since `boot` began. */
  mono: number;
  /** Names the boot that `mono` counts from. */
  boot: string;
  /** Last measured difference to the server's clock, or null when never measured. */
  skewMs: number | null;
}

/**
 * The envelope of one operation, the unit that phones send and the server keeps for good.
 * `nest`, `visit` and `reading` name the entity the operation opens or belongs to.
 */
export interface Op<Body = { [key: string]: Json }> {
  v: 1;
  opId: string;
  kind: string;
  kindV: number;
  deviceId: string;
  /** Per-device counter; orders a batch and shows gaps, never identifies. */
  n: number;
  nest: string | null;
  visit: string | null;
  reading: string | null;
  at: OpTime;
  hlc: string;
  deps: string[];
  body: Body;
  /** Lower-case hex SHA-256 of `hashedText`. */
  bodyHash: string;
}

/** The members that the body hash covers. */
export type HashedPart = Pick<Op, 'kind' | 'kindV' | 'nest' | 'visit' | 'reading' | 'at' | 'deps' | 'body'>;
