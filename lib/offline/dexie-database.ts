import { Dexie, type DexieOptions, type Table } from 'dexie';
import type { Lease } from './lease-row';
import type { LocalOp } from './local-op';
import type { RecorderPlace } from './recorder-view';
import type { StoreMeta } from './store';

/** The only row of a table that holds one thing. */
export interface OnlyRow<T> {
  id: 'only';
  value: T;
}

/** The database of one person of one team on this phone. */
export class RecordsDatabase extends Dexie {
  declare ops: Table<LocalOp, string>;
  declare meta: Table<OnlyRow<StoreMeta>, string>;
  declare places: Table<RecorderPlace, string>;
  declare leases: Table<OnlyRow<Lease>, string>;
  /** A newer version of the app, or a deletion, has taken the database over: this page must not open it again. */
  isTakenOver = false;
  private told: DatabaseListener = { takenOver: () => undefined, blocked: () => undefined };

  /**
   * @param name from `recordsName`.
   * @param options another IndexedDB implementation, for tests.
   */
  constructor(name: string, options: DexieOptions = {}) {
    // Strict: a transaction completes when it is on the disk, not when the system has promised to write it.
    super(name, { ...options, chromeTransactionDurability: 'strict' });
    this.version(1).stores({
      ops: 'key, [state+n], [state+key], [state+seq], outcome, reading, nest, visit, kind',
      meta: 'id',
      places: 'reading',
      leases: 'id',
    });
    // `false` ends Dexie's own handling, which would open an older version again and write through it.
    this.on('versionchange', () => {
      this.isTakenOver = true;
      this.close({ disableAutoOpen: true });
      this.told.takenOver();
      return false;
    });
    this.on('blocked', () => {
      this.told.blocked();
      return false;
    });
  }

  /** Says who hears that another tab stands in the way, or has taken the database over. */
  listen(told: DatabaseListener): void {
    this.told = told;
  }
}

/** Who hears what other tabs do to the database. */
export interface DatabaseListener {
  /** Another tab upgrades or deletes the database; this one has let go of it. */
  takenOver(): void;
  /** A tab with an older version still holds the database; it opens by itself once that tab lets go. */
  blocked(): void;
}

/** The name of a person's database. No two people and no two teams share one. */
export function recordsName(teamId: string, userId: string): string {
  return `undereave-${teamId}-${userId}`;
}
