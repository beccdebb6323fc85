import type { Random } from '@/lib/kit/random';
import type { Drain } from './drain';
import type { DrainEnd } from './drain-ports';
import type { Trouble } from './trouble';
import { type Timers, sleep } from './timers';

/** Something that may mean the network is back. */
export type WakeReason = 'online' | 'visible' | 'manual' | 'signed-in';

/** What the schedule runs on. */
export interface SchedulePorts {
  drain: Drain;
  timers: Timers;
  random: Random;
  /** Is something waiting that a pass could send? */
  isWaiting(): Promise<boolean>;
  /** A small question whether the office is there at all. */
  probe(): Promise<boolean>;
  /** Told how each pass ended. */
  ended(end: DrainEnd): void;
}

/** A running schedule. */
export interface Schedule {
  /** Starts a pass now and forgets past failures. */
  wake(reason: WakeReason): void;
  stop(): void;
}

/** How often an idle phone looks for new operations. */
export const TICK_MS = 5_000;

/** How often an idle phone asks the office for news. */
export const NEWS_MS = 60_000;

/** How often a phone that is waiting to try again asks whether the office is there. */
export const PROBE_EVERY_MS = 15_000;

const BACKOFF_FIRST_MS = 1_000;
const BACKOFF_MOST_MS = 5 * 60_000;

/** How long to wait after `failures` in a row: a random part of 1 s, 2 s, 4 s … up to 5 min (full jitter). */
export function backoffMs(failures: number, random: Random): number {
  return random() * Math.min(BACKOFF_MOST_MS, BACKOFF_FIRST_MS * 2 ** (failures - 1));
}

/** A wait that can be cut short. */
function waker(timers: Timers) {
  let current = new AbortController();
  return {
    wake: () => current.abort('wake'),
    isAwake: () => current.signal.aborted,
    sleep: (ms: number) => sleep(timers, ms, current.signal),
    rearm: () => {
      current = new AbortController();
    },
  };
}

/** Starts draining: at once, again after failures with growing waits, and every few seconds while something waits. */
export function startSchedule(ports: SchedulePorts): Schedule {
  const alarm = waker(ports.timers);
  let stopped = false;
  let failures = 0;
  let trouble: Trouble | undefined;
  let wish = { all: false };

  /** Another kind of trouble starts anew: an office that fails is at least one that can be reached. */
  function countFailure(end: DrainEnd): void {
    const now = end.kind === 'again' ? end.trouble : undefined;
    const before = now === trouble ? failures : 0;
    failures = now === undefined ? 0 : before + 1;
    trouble = now;
  }

  /** Until something waits, or it is time for news. */
  async function idle(): Promise<void> {
    for (let slept = 0; slept < NEWS_MS && !alarm.isAwake(); slept += TICK_MS) {
      await alarm.sleep(TICK_MS);
      if (await ports.isWaiting()) return;
    }
  }

  /** Through the back-off; shorter when the office turns out to be there again. */
  async function backOff(waitMs: number, mayProbe: boolean): Promise<void> {
    for (let left = waitMs; left > 0 && !alarm.isAwake(); left -= PROBE_EVERY_MS) {
      await alarm.sleep(Math.min(left, PROBE_EVERY_MS));
      if (mayProbe && left > PROBE_EVERY_MS && !alarm.isAwake() && (await ports.probe())) return;
    }
  }

  function rest(end: DrainEnd): Promise<void> {
    if (end.kind === 'done') return idle();
    // Emptied storage is founded anew right away, so there is soon something to send again.
    if (end.kind === 'elsewhere' || end.kind === 'cleared') return alarm.sleep(TICK_MS);
    if (end.kind !== 'again') return alarm.sleep(BACKOFF_MOST_MS);
    const wait = backoffMs(failures, ports.random);
    return backOff(Math.max(wait, end.afterMs ?? 0), end.afterMs === null);
  }

  async function run(): Promise<void> {
    while (!stopped) {
      alarm.rearm();
      const asked = wish;
      wish = { all: false };
      const end = await ports.drain(asked);
      countFailure(end);
      ports.ended(end);
      if (!alarm.isAwake()) await rest(end).catch(() => alarm.sleep(TICK_MS));
    }
  }

  void run();
  return {
    wake: (reason) => {
      failures = 0;
      if (reason === 'manual') wish = { all: true };
      alarm.wake();
    },
    stop: () => {
      stopped = true;
      alarm.wake();
    },
  };
}
