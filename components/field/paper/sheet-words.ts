import type { SheetFault } from '@/lib/comb/sheet-letters';
import { cellsWithinRing } from '@/lib/comb/walk';

/** Which cells a line of the sheet is about: `Ring 2: cells 7 to 18`. */
export function ringWords(ring: number): string {
  if (ring === 0) return 'Pedicel cell: 0';
  return `Ring ${ring}: cells ${cellsWithinRing(ring - 1)} to ${cellsWithinRing(ring) - 1}`;
}

/** What is wrong with one sign, and where. */
export function faultWords({ ring, cell, text }: SheetFault): string {
  return cell === null
    ? `Ring ${ring} has no place left for “${text}”.`
    : `Cell ${cell}: the sheet has no letter “${text}”.`;
}
