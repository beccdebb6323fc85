import type { Lease } from './lease-row';
import type { PhoneClock } from './phone-clock';
import type { Store } from './store';
import { type Timers, sleep } from './timers';

/** A holder that is alive renews this often. */
export const HEARTBEAT_MS = 5_000;

/** A holder that has not renewed for this long is taken to be frozen or dead. */
export const LEASE_MS = 20_000;

/**
 * The browser's lock of one origin, where it has one. It saves work; it decides nothing, because a frozen tab keeps it.
 *
 * @returns `run`'s promise; `free` tells whether nobody else held the lock.
 */
export type WebLock = <T>(run: (free: boolean | null) => Promise<T>) => Promise<T>;

/** What holding the lease needs. */
export interface LeasePorts {
  store: Store;
  clock: PhoneClock;
  timers: Timers;
  /** Names this tab; a fresh text for every page load. */
  holder: string;
  lock: WebLock;
}

/** Tells a drain whether it may go on. */
export interface HeldLease {
  lost(): boolean;
}

/** A lease that ends later than any holder could have asked for comes from a clock that was set back. */
function stillHeld(lease: Lease, now: number): boolean {
  return now < lease.until && lease.until <= now + LEASE_MS;
}

async function take({ store, clock, holder }: LeasePorts, free: boolean | null): Promise<boolean> {
  const now = clock.now();
  const mine = { holder, until: now + LEASE_MS };
  const after = await store.lease((before) => {
    const open = !before || before.holder === holder || free === true || !stillHeld(before, now);
    return open ? mine : before;
  });
  return after?.holder === holder;
}

async function renew({ store, clock, holder }: LeasePorts): Promise<boolean> {
  const until = clock.now() + LEASE_MS;
  const after = await store.lease((before) => (before?.holder === holder ? { holder, until } : before));
  return after?.holder === holder;
}

async function release({ store, holder }: LeasePorts): Promise<void> {
  await store.lease((before) => (before?.holder === holder ? null : before));
}

/** Renews until stopped; returns early when another tab has taken over or the storage fails. */
async function heartbeat(ports: LeasePorts, stop: AbortSignal): Promise<void> {
  for (;;) {
    await sleep(ports.timers, HEARTBEAT_MS, stop);
    if (stop.aborted || !(await renew(ports))) return;
  }
}

/**
 * Runs `work` as the only drain of these records, as far as that can be known. A second one would do no harm, only
 * waste: the office tells every repeated operation by its id.
 *
 * @returns what `work` returns, or null when another live tab is at it.
 */
export async function withLease<T>(ports: LeasePorts, work: (lease: HeldLease) => Promise<T>): Promise<T | null> {
  return ports.lock(async (free) => {
    if (!(await take(ports, free))) return null;
    const stop = new AbortController();
    let lost = false;
    const beating = heartbeat(ports, stop.signal).then(
      () => (lost = true),
      () => (lost = true),
    );
    try {
      return await work({ lost: () => lost });
    } finally {
      stop.abort('done');
      await beating;
      await release(ports).catch(() => undefined);
    }
  });
}

/** For browsers without locks, and tests: the lease alone decides. */
export const noWebLock: WebLock = (run) => run(null);
