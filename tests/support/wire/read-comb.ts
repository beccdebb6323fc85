import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import { type VisitIds, freshIds, markOp, openingOps } from './first-visit';
import { WireClient } from './wire-client';
import { wireOp } from './wire-op';

/** A comb read in the field and handed in. */
export interface FieldComb {
  ids: VisitIds;
  /** Its marks, in walk order. */
  marks: Op[];
}

/** The states of a comb of so many cells, oldest in the middle. */
export function combStates(count: number): CellState[] {
  const states = ['capped', 'large', 'medium', 'small', 'egg', 'empty'] as const;
  return spiral(count).map((_, index) => states[Math.floor((index * states.length) / count)] ?? 'egg');
}

/** Operations a push takes at once. */
const BATCH = 80;

async function pushAll(client: WireClient, ops: readonly Op[]): Promise<void> {
  for (let from = 0; from < ops.length; from += BATCH) await client.push(ops.slice(from, from + BATCH));
}

async function client(origin: string, email: string): Promise<WireClient> {
  const signedIn = new WireClient(origin);
  await signedIn.signIn(email);
  await signedIn.enrol();
  return signedIn;
}

/** A technician reads a comb and hands it in; every mark carries `more`. */
export async function readInField(
  origin: string,
  comb: { code: string; states: readonly CellState[]; more?: Record<string, Json> },
): Promise<FieldComb> {
  const phone = await client(origin, 'technician@tarrow.example');
  const ids = freshIds();
  const cells = spiral(comb.states.length);
  const marks = comb.states.map((state, i) => markOp(ids, { q: 0, r: 0, ...cells[i], state, ...comb.more }));
  const submit = wireOp({ kind: 'reading.submit', ...ids, body: {} });
  await pushAll(phone, [...openingOps(ids, comb.code), ...marks, submit]);
  return { ids, marks };
}

/** A reviewer reads the comb of a visit a second time and hands it in, with no browser between. */
export async function readAgain(origin: string, ids: VisitIds, states: readonly CellState[]): Promise<void> {
  const lab = await client(origin, 'reviewer@tarrow.example');
  const own = { ...ids, reading: freshIds().reading };
  const cells = spiral(states.length);
  await pushAll(lab, [
    wireOp({ kind: 'reading.open', ...own, body: { kind: 'second', source: 'photo' } }),
    ...states.map((state, i) => markOp(own, { q: 0, r: 0, ...cells[i], state })),
    wireOp({ kind: 'reading.submit', ...own, body: {} }),
  ]);
}
