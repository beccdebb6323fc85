import { v7 } from 'uuid';
import type { Random } from '@/lib/kit/random';
import type { PhoneClock } from './phone-clock';
import type { Timers } from './timers';

const boot = v7();

/** The phone's clocks. `mono` counts from the load of this page, which `boot` names. */
export const browserClock: PhoneClock = {
  now: () => Date.now(),
  mono: () => Math.round(performance.now() * 10) / 10,
  boot: () => boot,
  offsetMinutes: (epochMs) => -new Date(epochMs).getTimezoneOffset(),
};

/** The browser's timers. */
export const browserTimers: Timers = {
  after: (ms, fire) => {
    const id = setTimeout(fire, ms);
    return () => clearTimeout(id);
  },
};

/** The browser's chance, for waiting times. Not for secrets. */
export const browserRandom: Random = () => Math.random();

/** A fresh UUIDv7 from the browser's cryptographic chance. */
export function browserId(): string {
  return v7();
}
