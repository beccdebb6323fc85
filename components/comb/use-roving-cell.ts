import { useState } from 'react';
import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import { byWalkOrder } from '@/lib/comb/walk';

interface Roving {
  /** The place that Tab reaches: the last one the keyboard went to, else the current cell, else the first of the walk. */
  place: Axial | null;
  /** Moves the Tab stop to a place. */
  moveTo: (place: Axial) => void;
}

/**
 * One Tab stop in a whole comb (roving focus). A new `current` cell takes the stop back to itself.
 *
 * @param places all places that can hold the focus.
 * @param current the cell the person works on, if any.
 */
export function useRovingCell(places: readonly Axial[], current: Axial | null): Roving {
  const currentKey = current ? cellKey(current) : null;
  const [roved, setRoved] = useState<{ key: string; during: string | null } | null>(null);
  const moveTo = (place: Axial): void => setRoved({ key: cellKey(place), during: currentKey });
  const isHere = (key: string | null): key is string => key !== null && places.some((place) => cellKey(place) === key);
  if (roved && roved.during === currentKey && isHere(roved.key)) return { place: parseCellKey(roved.key), moveTo };
  if (isHere(currentKey)) return { place: current, moveTo };
  const [first] = [...places].sort(byWalkOrder);
  return { place: first ?? null, moveTo };
}
