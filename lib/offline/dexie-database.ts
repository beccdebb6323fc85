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
  }
}

/** The name of a person's database. No two people and no two teams share one. */
export function recordsName(teamId: string, userId: string): string {
  return `undereave-${teamId}-${userId}`;
}
