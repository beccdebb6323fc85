import type { MemoryDisk } from './memory-disk';
import type { ModelServer } from './model-server';
import type { SimClock } from './sim-clock';
import type { SimTab } from './sim-tab';

/** An operation a person saw as saved. */
export interface SavedOp {
  opId: string;
  bodyHash: string;
  disk: MemoryDisk;
}

/** A phone: one disk, one clock, one or two tabs. */
export interface SimPhone {
  disk: MemoryDisk;
  clock: SimClock;
  user: string;
  tabs: SimTab[];
  /** True once the browser has emptied it: what only it had may be gone. */
  wiped: boolean;
}

/** What the invariants are checked against. */
export interface RunFacts {
  readonly server: ModelServer;
  readonly phones: readonly SimPhone[];
  /** Operations shown as saved, by id. */
  readonly saved: ReadonlyMap<string, SavedOp>;
  /** Every id that was ever made. */
  readonly made: ReadonlySet<string>;
  /** Ids that may come out differently: made wrong on purpose. */
  readonly exempt: ReadonlySet<string>;
  /** How often the office was restored from a backup. */
  readonly restores: number;
}
