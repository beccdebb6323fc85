import type { Json } from './canonical-json';
import type { OpCode } from './op-codes';

/** Can every machine hold this number exactly as it was meant? Whole numbers above 2^53 − 1 lose their last digits. */
function isSafe(value: number): boolean {
  return Number.isFinite(value) && (!Number.isInteger(value) || Number.isSafeInteger(value));
}

/** Checks all numbers in a value: `number` for an infinite one or a whole one above 2^53 − 1. */
export function checkNumbers(value: Json): OpCode | null {
  if (typeof value === 'number') return isSafe(value) ? null : 'number';
  if (value === null || typeof value !== 'object') return null;
  return Object.values(value).some((item) => checkNumbers(item) !== null) ? 'number' : null;
}
