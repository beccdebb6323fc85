import type { Store } from './store';
import { type Timers, within } from './timers';

/** A storage call that has not ended by then hangs on a connection that the browser has dropped. */
const PATIENCE_MS = 10_000;

/** The same storage, except that a call which hangs fails instead of holding up everything behind it. */
export function watchStore(store: Store, timers: Timers): Store {
  const watched = <T>(work: Promise<T>) => within(timers, PATIENCE_MS, work);
  return {
    transact: (keys, change) => watched(store.transact(keys, change)),
    found: (meta) => watched(store.found(meta)),
    readMeta: () => watched(store.readMeta()),
    queued: (limit) => watched(store.queued(limit)),
    inState: (state, limit) => watched(store.inState(state, limit)),
    heldAfter: (key, limit) => watched(store.heldAfter(key, limit)),
    heldUpTo: (seq, limit) => watched(store.heldUpTo(seq, limit)),
    counts: () => watched(store.counts()),
    opsOfReading: (reading) => watched(store.opsOfReading(reading)),
    opsOfNest: (nest) => watched(store.opsOfNest(nest)),
    place: (reading) => watched(store.place(reading)),
    lease: (change) => watched(store.lease(change)),
    probe: () => watched(store.probe()),
    reopen: () => watched(store.reopen()),
  };
}
