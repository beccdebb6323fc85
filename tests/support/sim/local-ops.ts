import { createHash } from 'node:crypto';
import { type LocalOp, type OpDraft, queuedOp } from '@/lib/offline/local-op';
import { type OpMaker, makeOp } from '@/lib/offline/make-op';
import type { PhoneClock } from '@/lib/offline/phone-clock';
import { type StoreMeta, newMeta } from '@/lib/offline/store';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';

/** The nest, visit, reading and people of the unit tests. */
export const NEST = '00000000-0000-7000-8000-000000000001';
export const VISIT = '00000000-0000-7000-8000-000000000002';
export const READING = '00000000-0000-7000-8000-000000000003';
export const ME = 'user-me';
export const OTHER = 'user-other';

/** UUID text with a number at its end. */
export function id(number: number): string {
  return `10000000-0000-7000-8000-${String(number).padStart(12, '0')}`;
}

/** SHA-256 of UTF-8 text as lower-case hex. */
export async function sha256(text: string): Promise<string> {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** An op maker whose ids count up from 1. */
export function countingMaker(clock: PhoneClock): OpMaker {
  let made = 0;
  return { clock, sha256, skewMs: () => null, newId: () => id(++made) };
}

/** One mark as a draft. */
export function markDraft(
  maker: OpMaker,
  body: { q: number; r: number; state: 'egg' | 'empty' | 'small' },
): Promise<OpDraft> {
  const content = { nectar: false, unsure: false, ...body };
  return makeOp(maker, { kind: 'cell.mark', nest: NEST, visit: VISIT, reading: READING, body: content });
}

type OpInput = Partial<Omit<Op, 'body'>> & { kind: string; body?: { [key: string]: Json } };

/** An operation with everything a test does not care about filled in. Numbers and clocks follow `n`. */
export function op({ n = 1, ...rest }: OpInput): Op {
  return {
    v: 1,
    opId: id(n),
    kindV: 1,
    deviceId: 'device',
    n,
    nest: NEST,
    visit: null,
    reading: null,
    at: { wall: `2026-06-16T05:41:${String(n % 60).padStart(2, '0')}.000-04:00`, mono: n, boot: 'boot', skewMs: null },
    hlc: `${1_000 + n}.0`,
    deps: [],
    body: {},
    bodyHash: `hash-${n}`,
    ...rest,
  };
}

/** A row of this phone, queued unless told otherwise. */
export function row(input: OpInput, part: Partial<LocalOp> = {}): LocalOp {
  return { ...queuedOp(op(input), ME, 0), ...part };
}

/** A meta row of an enrolled phone. */
export function meta(part: Partial<StoreMeta> = {}): StoreMeta {
  return { ...newMeta('sentinel', ME), deviceId: 'device', deviceEpoch: 1, epoch: 1, ...part };
}
