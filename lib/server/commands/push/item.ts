import 'server-only';
import type { Result } from '@/lib/kit/result';
import { type OpFault, type ValidOp, validateOp } from '@/lib/protocol/validate-op';
import { type RawOp, digestOf, sha256Hex } from './raw-op';

/** One element of a push, judged by itself. */
export interface Item extends RawOp {
  /** Its place in the request. */
  index: number;
  digest: string;
  checked: Result<ValidOp, OpFault>;
}

/** Judges every element by itself; nothing here depends on what is stored. */
export function itemsOf(rawOps: readonly RawOp[]): Item[] {
  return rawOps.map((rawOp, index) => ({
    ...rawOp,
    index,
    digest: digestOf(rawOp),
    checked: validateOp(rawOp.value, sha256Hex),
  }));
}
