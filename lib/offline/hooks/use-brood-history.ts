'use client';

import { useEffect, useState } from 'react';
import { type BroodHistory, broodHistory } from '@/lib/offline/brood-history';
import { foldVisits } from '@/lib/offline/fold-visits';
import type { Records } from '@/lib/offline/records';
import { useRecords } from './use-standing';

/** What a phone knows of earlier visits, and the reading it was asked for. */
interface Loaded {
  reading: string;
  history: BroodHistory | null;
}

async function read({ store, person }: Records, nest: string, reading: string): Promise<BroodHistory | null> {
  const rows = await store.opsOfNest(nest);
  return broodHistory(foldVisits(rows, person.userId), reading, rows);
}

/**
 * What this phone knows of a nest's brood before the visit of a reading; undefined while loading, null when it cannot
 * tell. Read once: earlier visits do not change while a comb is read, and no press may read a whole nest again.
 */
export function useBroodHistory(nest: string, reading: string): BroodHistory | null | undefined {
  const records = useRecords();
  const [loaded, setLoaded] = useState<Loaded | null>(null);
  useEffect(() => {
    if (!records) return;
    let current = true;
    const show = (history: BroodHistory | null) => current && setLoaded({ reading, history });
    read(records, nest, reading).then(show, () => show(null));
    return () => {
      current = false;
    };
  }, [records, nest, reading]);
  return loaded?.reading === reading ? loaded.history : undefined;
}
