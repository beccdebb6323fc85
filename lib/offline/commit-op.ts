import { formatHlc, parseHlc, tickHlc } from '@/lib/kit/hlc';
import type { Op } from '@/lib/protocol/op';
import { type OpDraft, queuedOp } from './local-op';
import { NotSavedError, StorageCleared, notSavedReason } from './not-saved';
import type { PhoneClock } from './phone-clock';
import type { RecorderPlace } from './recorder-view';
import type { Change, Snapshot, Store, StoreMeta } from './store';
import { type Timers, within } from './timers';

/** What saving needs. */
export interface CommitPorts {
  store: Store;
  clock: PhoneClock;
  timers: Timers;
}

/** What is saved together: operations in the order they were made, and where the person is in the reading. */
export interface CommitEntry {
  drafts: readonly OpDraft[];
  place?: RecorderPlace;
}

/** A transaction that has not ended by then will not end: a connection that a phone's browser has dropped hangs. */
export const WATCHDOG_MS = 5_000;

const ATTEMPTS = 4;

/** Puts the next number and clock reading of this phone on a draft. */
function stamp(meta: StoreMeta, draft: OpDraft, wallMs: number): { op: Op; meta: StoreMeta } {
  const hlc = formatHlc(tickHlc(parseHlc(meta.hlc) ?? { ms: 0, counter: 0 }, wallMs));
  const n = meta.n + 1;
  return { op: { ...draft, deviceId: meta.deviceId ?? '', n, hlc }, meta: { ...meta, n, hlc } };
}

/** The change that saves an entry. A draft that an earlier, slow attempt has saved after all stays as it is. */
function saveEntry({ drafts, place }: CommitEntry, now: number) {
  return (before: Snapshot): Change<Op[]> => {
    if (!before.meta) throw new StorageCleared('the storage was emptied');
    let meta = before.meta;
    const saved = drafts.map((draft) => {
      const known = before.ops.get(draft.opId);
      if (known) return known;
      const stamped = stamp(meta, draft, now);
      meta = stamped.meta;
      return queuedOp(stamped.op, meta.userId, now);
    });
    return { result: saved.map((row) => row.op), meta, ops: saved, place };
  };
}

/**
 * Saves operations and the place in one strict transaction. Resolves only when it has completed: from then on the
 * operations survive a kill. A failed attempt drops the connection, opens a new one and tries again, three times.
 *
 * @throws NotSavedError when nothing helped; it carries the drafts.
 */
export async function commitOps({ store, clock, timers }: CommitPorts, entry: CommitEntry): Promise<Op[]> {
  const keys = entry.drafts.map((draft) => draft.opId);
  let failure: unknown;
  for (let attempt = 1; attempt <= ATTEMPTS; attempt++) {
    try {
      return await within(timers, WATCHDOG_MS, store.transact(keys, saveEntry(entry, clock.now())));
    } catch (error) {
      failure = error;
      if (notSavedReason(error) === 'cleared') break;
      await within(timers, WATCHDOG_MS, store.reopen()).catch(() => undefined);
    }
  }
  throw new NotSavedError(notSavedReason(failure), entry.drafts, failure);
}
