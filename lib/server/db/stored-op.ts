import 'server-only';
import type { Op } from '@/lib/protocol/op';

/** The operation in a row of `ops`. Only checked operations are ever written there. */
export function storedOp(text: string): Op {
  return JSON.parse(text) as Op;
}
