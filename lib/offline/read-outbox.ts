import type { RecordsDatabase } from './dexie-database';
import { inState } from './dexie-store';
import type { LocalOp } from './local-op';
import { opWords } from './op-words';

/** One operation that is not where it should be. */
export interface OutboxItem {
  opId: string;
  words: string;
  nest: string | null;
  /** Epoch milliseconds of the phone's clock. */
  savedAt: number;
  why: 'waiting' | 'refused' | 'suspect' | 'set-aside';
  /** The office's reason. */
  code: string | null;
}

/** The outbox as the screen lists it. */
export interface OutboxLists {
  waiting: number;
  /** The first operations still to be sent, in order. */
  queue: OutboxItem[];
  /** Refused, suspect and set-aside operations: they need a person. */
  attention: OutboxItem[];
}

/** Most operations listed; more are counted. */
const LISTED = 200;

function itemOf({ op, nest, savedAt, code }: LocalOp, why: OutboxItem['why']): OutboxItem {
  return { opId: op.opId, words: opWords(op), nest, savedAt, why, code };
}

function setAside(db: RecordsDatabase): Promise<LocalOp[]> {
  return db.ops
    .where('outcome')
    .anyOf('quarantined', 'conflict')
    .filter((row) => row.state === 'held')
    .limit(LISTED)
    .toArray();
}

/** What waits, and what needs a person. */
export async function readOutbox(db: RecordsDatabase): Promise<OutboxLists> {
  const list = (state: LocalOp['state']) => inState(db, state, 'n').limit(LISTED).toArray();
  const [waiting, queue, refused, suspect, aside] = await Promise.all([
    inState(db, 'queued', 'n').count(),
    list('queued'),
    list('refused'),
    list('suspect'),
    setAside(db),
  ]);
  return {
    waiting,
    queue: queue.map((row) => itemOf(row, 'waiting')),
    attention: [
      ...refused.map((row) => itemOf(row, 'refused')),
      ...suspect.map((row) => itemOf(row, 'suspect')),
      ...aside.map((row) => itemOf(row, 'set-aside')),
    ],
  };
}

/** Everything that is not at the office, whole. */
export async function readUnsent(db: RecordsDatabase): Promise<LocalOp[]> {
  const states = ['queued', 'suspect', 'refused'] as const;
  const lists = await Promise.all(states.map((state) => inState(db, state, 'n').toArray()));
  return [...lists.flat(), ...(await setAside(db))];
}

/** Everything that the office's backup may not have, whole: what one needs a copy of before deleting it here. */
export async function readUnbacked(db: RecordsDatabase): Promise<LocalOp[]> {
  const states = ['queued', 'suspect', 'refused', 'held'] as const;
  const lists = await Promise.all(states.map((state) => inState(db, state, 'n').toArray()));
  return lists.flat();
}
