import { createHash } from 'node:crypto';
import { v7 } from 'uuid';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import { hashedText } from '@/lib/protocol/op-hash';

/** What a test says about an operation; everything else is filled in. */
export type WireOpInput = Partial<Omit<Op, 'body' | 'kind'>> & { kind: string; body: { [key: string]: Json } };

let counter = 0;

/** SHA-256 of UTF-8 text as lower-case hex. */
export function sha256Hex(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** Builds a complete operation with a right body hash, as a phone would. */
export function wireOp(input: WireOpInput): Op {
  counter += 1;
  const bare: Omit<Op, 'bodyHash'> = {
    v: 1,
    opId: v7(),
    kindV: 1,
    deviceId: v7(),
    n: counter,
    nest: null,
    visit: null,
    reading: null,
    at: {
      wall: '2026-06-16T05:41:07.120-04:00',
      mono: 1000.5 + counter,
      boot: '5f0c3a52-8a2f-4d0c-9f0a-0a6f5a1c2b3d',
      skewMs: null,
    },
    hlc: `1781602867120.${counter}`,
    deps: [],
    ...input,
  };
  return { ...bare, bodyHash: input.bodyHash ?? sha256Hex(hashedText(bare)) };
}
