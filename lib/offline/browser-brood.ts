import { BroodAsker } from './brood-asker';
import { browserTimers } from './browser-clock-edge';

/** Where the build puts the worker: below /field, where the service worker answers for it without signal. */
const WORKER_URL = '/field/brood-worker.js';

/** The asker of this page. Only in the browser. */
const asker = new BroodAsker({ makeWorker: () => new Worker(WORKER_URL), timers: browserTimers });

/** Estimates a nest in a worker of this browser, with or without signal. */
export const askBrood = asker.ask;
