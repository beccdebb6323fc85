import type { DexieOptions } from 'dexie';
import type { Random } from '@/lib/kit/random';
import type { Sha256 } from '@/lib/protocol/op-hash';
import type { WebLock } from './lease';
import type { Network } from './network';
import type { PhoneClock } from './phone-clock';
import type { Timers } from './timers';

/** Everything outside that the field app is handed: the browser's in the app, doubles in tests. */
export interface Edges {
  clock: PhoneClock;
  timers: Timers;
  random: Random;
  network: Network;
  sha256: Sha256;
  newId(): string;
  webLock(name: string): WebLock;
  /** Asks to be woken when the network is back, where the browser can do that. */
  askForWake(): Promise<void>;
  /** Another IndexedDB implementation, for tests. */
  dexie?: DexieOptions;
  /** Names this load of the page: what it left unfinished, it may take up again at once. */
  page: string;
  /** The name the office shows for this phone. */
  label: string;
}
