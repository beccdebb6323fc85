import { BroodAsker, type BroodWorker, type WorkerListener } from './brood-asker';
import { browserTimers } from './browser-clock-edge';

/** Where the build puts the worker: below /field, where the service worker answers for it without signal. */
const WORKER_URL = '/field/brood-worker.js';

function makeWorker({ said, broken }: WorkerListener): BroodWorker {
  const worker = new Worker(WORKER_URL);
  worker.onmessage = ({ data }: MessageEvent<unknown>) => said(data);
  worker.onmessageerror = broken;
  worker.onerror = (event) => {
    // It is told to the person who asked, in words; the browser need not report it too.
    event.preventDefault();
    broken();
  };
  return { post: (question) => worker.postMessage(question), stop: () => worker.terminate() };
}

const asker = new BroodAsker({ makeWorker, timers: browserTimers });

/** Estimates a nest in a worker of this browser, with or without signal. */
export const askBrood = asker.ask;
