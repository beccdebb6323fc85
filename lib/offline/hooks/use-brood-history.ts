'use client';

import { useEffect, useState } from 'react';
import { type BroodHistory, broodHistory } from '@/lib/offline/brood-history';
import { foldVisits } from '@/lib/offline/fold-visits';
import type { Records } from '@/lib/offline/records';
import { useRecords } from './use-standing';

/** What a phone knows of earlier visits, and which visit that was asked for. */
interface Loaded {
  visit: string;
  history: BroodHistory | null;
}

async function read({ store, person }: Records, nest: string, visit: string): Promise<BroodHistory | null> {
  const rows = await store.opsOfNest(nest);
  return broodHistory(foldVisits(rows, person.userId), visit, rows);
}

/**
 * What this phone knows of a nest's brood before a visit; undefined while loading, null when it does not hold the
 * visit. Read once: earlier visits do not change while a comb is read, and no press may read a whole nest again.
 */
export function useBroodHistory(nest: string, visit: string): BroodHistory | null | undefined {
  const records = useRecords();
  const [loaded, setLoaded] = useState<Loaded | null>(null);
  useEffect(() => {
    if (!records) return;
    let current = true;
    const show = (history: BroodHistory | null) => current && setLoaded({ visit, history });
    read(records, nest, visit).then(show, () => show(null));
    return () => {
      current = false;
    };
  }, [records, nest, visit]);
  return loaded?.visit === visit ? loaded.history : undefined;
}
