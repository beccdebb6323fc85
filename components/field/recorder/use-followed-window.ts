'use client';

import { useState } from 'react';
import { type CombWindow, followWindow } from '@/components/comb/comb-view';
import type { Axial } from '@/lib/comb/axial';

const START: CombWindow = { centre: { q: 0, r: 0 }, across: 7, down: 5 };

/** A window of seven cells across that stays where it is until the cell comes near its edge. */
export function useFollowedWindow(cell: Axial | null): CombWindow {
  const [window, setWindow] = useState(START);
  const followed = cell ? followWindow(window, cell) : window;
  if (followed !== window) setWindow(followed);
  return followed;
}
