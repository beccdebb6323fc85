'use client';

import { useState } from 'react';
import { type Axial, cellKey } from '@/lib/comb/axial';

/** Every cell that has been the current one since the reading was opened here, by `cellKey`. */
export function useLookedAt(current: Axial | null): ReadonlySet<string> {
  const [looked, setLooked] = useState<ReadonlySet<string>>(new Set());
  const key = current && cellKey(current);
  if (key !== null && !looked.has(key)) setLooked(new Set([...looked, key]));
  return looked;
}
