import { compareHlc } from '@/lib/kit/hlc';
import type { Json } from './canonical-json';

/** One setting of a register: a field or note of an entity, with its history. */
export interface RegisterSet {
  opId: string;
  hlc: string;
  /** The settings this one was made from; it takes their place. */
  bases: readonly string[];
  value: Json;
}

/** `base` of a body as a list of operation ids. */
export function basesOf(base: Json | undefined): string[] {
  if (typeof base === 'string') return [base];
  return Array.isArray(base) ? base.map(String) : [];
}

/** Later clock wins, then the higher operation id. */
function isLater(a: RegisterSet, b: RegisterSet): boolean {
  return (compareHlc(a.hlc, b.hlc) || (a.opId > b.opId ? 1 : -1)) > 0;
}

/**
 * The setting that is shown: among those no other was made from, the one with the highest clock, then operation id.
 * With more than one left the register is in conflict and a person decides; nothing is lost.
 */
export function registerWinner(sets: readonly RegisterSet[]): RegisterSet | null {
  const replaced = new Set(sets.flatMap((set) => set.bases));
  let winner: RegisterSet | null = null;
  for (const set of sets) {
    if (!replaced.has(set.opId) && (!winner || isLater(set, winner))) winner = set;
  }
  return winner;
}
