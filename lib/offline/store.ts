import type { HeldVisit } from '@/lib/protocol/pull';
import type { Lease } from './lease-row';
import type { LocalOp } from './local-op';
import type { RecorderPlace } from './recorder-view';

/** What a phone knows about itself and the office, one row. */
export interface StoreMeta {
  /** Random text made with the database. When this row is missing, the browser has cleared our storage. */
  sentinel: string;
  /** Whose records these are. */
  userId: string;
  /** The device the office enrolled; null before the first time. */
  deviceId: string | null;
  /** The last epoch in which the office was seen to know that device; 0 when never. */
  deviceEpoch: number;
  /** Incarnation of the office's data; 0 before the first enrolment. */
  epoch: number;
  /** Every office row up to this `seq` is stored here. */
  cursor: number;
  /** Highest `seq` that a restore of the office would bring back. */
  safeSeq: number;
  /** Last clock reading given out, `"<ms>.<counter>"`. */
  hlc: string;
  /** Last per-device number given out. */
  n: number;
  /** Last measured difference to the office's clock. */
  skewMs: number | null;
  /** Set while the office of a new epoch is asked what it has: the last key asked about, `''` at the start. */
  reofferAfter: string | null;
  /** True until the first complete pull of a new epoch: rows of the old one are still shown. */
  resync: boolean;
  /** Epoch milliseconds when the office last confirmed that nothing waits. */
  lastSync: number | null;
  /** Visits of which the office held something back at the last pull; missing before the first. */
  held?: readonly HeldVisit[];
}

/** What a transaction has read. `meta` is null when the storage was cleared. */
export interface Snapshot {
  meta: StoreMeta | null;
  ops: ReadonlyMap<string, LocalOp>;
}

/** What a transaction writes, and what it tells its caller. */
export interface Change<T> {
  result: T;
  meta?: StoreMeta;
  ops?: readonly LocalOp[];
  place?: RecorderPlace;
  /** Drops the office rows of every other epoch than this. */
  keepEpoch?: number;
}

/** How many operations stand where. */
export interface OpCounts {
  queued: number;
  suspect: number;
  /** Refused, and nobody has looked at it yet. */
  refused: number;
  /** Held by the office but set aside there (quarantined, conflict), and nobody has looked at it yet. */
  setAside: number;
}

/**
 * The phone's storage. Each method is one transaction; `transact` resolves only when its transaction has completed
 * and is on the disk, and rejects when it was aborted, whatever its single requests reported.
 */
export interface Store {
  /**
   * Reads the meta row and the named operations, lets `change` decide, and writes what it returns: all of it or
   * nothing. `change` is pure and may run more than once; when it throws, nothing is written.
   */
  transact<T>(keys: readonly string[], change: (before: Snapshot) => Change<T>): Promise<T>;
  /** Writes the meta row unless there is one; returns the one that stands. */
  found(meta: StoreMeta): Promise<StoreMeta>;
  readMeta(): Promise<StoreMeta | null>;
  /** The oldest queued operations by `n`. */
  queued(limit: number): Promise<LocalOp[]>;
  /** All operations in a state, at most `limit`. */
  inState(state: 'suspect' | 'refused', limit: number): Promise<LocalOp[]>;
  /** Held operations by key, after a key. */
  heldAfter(key: string, limit: number): Promise<LocalOp[]>;
  /** Held operations with 1 ≤ seq ≤ `seq`. */
  heldUpTo(seq: number, limit: number): Promise<LocalOp[]>;
  counts(): Promise<OpCounts>;
  opsOfReading(reading: string): Promise<LocalOp[]>;
  opsOfNest(nest: string): Promise<LocalOp[]>;
  place(reading: string): Promise<RecorderPlace | null>;
  /** Replaces the lease by what `change` returns for the present one. */
  lease(change: (before: Lease | null) => Lease | null): Promise<Lease | null>;
  /** A cheap read, to find out whether the connection still lives. */
  probe(): Promise<void>;
  /** Drops the connection and opens a new one. */
  reopen(): Promise<void>;
}

/** A fresh meta row. */
export function newMeta(sentinel: string, userId: string): StoreMeta {
  return {
    sentinel,
    userId,
    deviceId: null,
    deviceEpoch: 0,
    epoch: 0,
    cursor: 0,
    safeSeq: 0,
    hlc: '0.0',
    n: 0,
    skewMs: null,
    reofferAfter: null,
    resync: false,
    lastSync: null,
  };
}
