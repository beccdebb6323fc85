import { type Json, canonicalJson } from './canonical-json';
import { MAX_OP_BYTES } from './limits';
import type { Op } from './op';
import type { OpCode } from './op-codes';

/** Body members that hold free text, which has a limit of its own. */
const FREE_TEXT: ReadonlySet<string> = new Set(['note', 'text', 'reason', 'value']);

function isFreeText([name, value]: [string, Json]): boolean {
  return FREE_TEXT.has(name) && typeof value === 'string';
}

/** Checks the size of an operation, its free text left out: `too-long` above the limit. */
export function checkSize(op: Op): OpCode | null {
  const { wall, mono, boot, skewMs } = op.at;
  const body = Object.fromEntries(Object.entries(op.body).filter((member) => !isFreeText(member)));
  const text = canonicalJson({ ...op, at: { wall, mono, boot, skewMs }, body });
  return new TextEncoder().encode(text).length > MAX_OP_BYTES ? 'too-long' : null;
}
