import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { RecordsDatabase } from '@/lib/offline/dexie-database';

/** IndexedDB of a phone that has stored nothing yet. */
export function freshIndexedDb() {
  return { indexedDB: new IDBFactory(), IDBKeyRange };
}

/** The records database of a phone, empty unless the IndexedDB given holds some. */
export function freshDatabase(idb = freshIndexedDb()): RecordsDatabase {
  return new RecordsDatabase('undereave-team-me', idb);
}
