'use client';

import { useLiveQuery } from 'dexie-react-hooks';
import type { RecordsDatabase } from '@/lib/offline/dexie-database';
import { useRecords } from './use-standing';

/** A result and what it is the result of: a changed question must not be answered by the last one's result. */
interface Tagged<T> {
  tag: string;
  value: T;
}

/**
 * What a query of the open records gives, again after every change that concerns it.
 *
 * @param query reads; `me` is the user id of the person at the phone.
 * @param deps what names the question.
 * @returns undefined while loading and while no records are open.
 */
export function useRead<T>(
  query: (db: RecordsDatabase, me: string) => Promise<T>,
  deps: readonly string[],
): T | undefined {
  const records = useRecords();
  const tag = [records?.db.name, ...deps].join(' ');
  const read = async (): Promise<Tagged<T> | undefined> =>
    records ? { tag, value: await query(records.db, records.person.userId) } : undefined;
  const result = useLiveQuery(read, [records, tag]);
  return result?.tag === tag ? result.value : undefined;
}
