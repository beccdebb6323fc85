import type { Json } from '@/lib/protocol/canonical-json';
import type { OpKind } from '@/lib/protocol/op';
import { OP_BODIES, type OpBody } from '@/lib/protocol/op-bodies';
import { type Sha256, hashedText } from '@/lib/protocol/op-hash';
import type { OpDraft } from './local-op';
import { type PhoneClock, wallText } from './phone-clock';

/** What an operation needs from the phone. */
export interface OpMaker {
  clock: PhoneClock;
  /** A fresh UUID in lower-case text. */
  newId(): string;
  sha256: Sha256;
  /** The last measured difference to the office's clock, or null. */
  skewMs(): number | null;
}

/** What happened, in the words of one kind of operation. */
export interface OpRequest<K extends OpKind = OpKind> {
  kind: K;
  nest: string | null;
  visit: string | null;
  reading: string | null;
  body: OpBody<K>;
}

/** The members that have a value: what is not said is not sent. */
function said(body: Record<string, unknown>): { [key: string]: Json } {
  const known = Object.entries(body).filter(([, value]) => value !== undefined);
  // A body that passed its schema holds nothing but JSON.
  return Object.fromEntries(known) as { [key: string]: Json };
}

/** An operation whose body hash is not computed yet. */
export type OpenDraft = Omit<OpDraft, 'bodyHash'>;

/**
 * Begins an operation at the moment it happens: its id and its times. Its counters follow when it is saved.
 *
 * @throws ZodError for a body that the kind does not allow: wrong data made here must not become a record.
 */
export function beginOp<K extends OpKind>(maker: OpMaker, request: OpRequest<K>): OpenDraft {
  const { clock } = maker;
  const now = clock.now();
  return {
    v: 1,
    opId: maker.newId(),
    kind: request.kind,
    kindV: 1,
    nest: request.nest,
    visit: request.visit,
    reading: request.reading,
    at: { wall: wallText(clock, now), mono: clock.mono(), boot: clock.boot(), skewMs: maker.skewMs() },
    deps: [],
    body: said(OP_BODIES[request.kind].parse(request.body)),
  };
}

/** Adds the body hash. This must happen before a transaction is opened, which would end while it waits for it. */
export async function sealOp({ sha256 }: Pick<OpMaker, 'sha256'>, draft: OpenDraft): Promise<OpDraft> {
  return { ...draft, bodyHash: await sha256(hashedText(draft)) };
}

/** Begins and seals an operation. */
export function makeOp<K extends OpKind>(maker: OpMaker, request: OpRequest<K>): Promise<OpDraft> {
  return sealOp(maker, beginOp(maker, request));
}
