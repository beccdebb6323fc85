import { Workbox } from 'workbox-window';
import type { ServiceWorkerUpdate } from './service-worker-update';
import { type Signal, createSignal } from './signal';

let update: Signal<ServiceWorkerUpdate> | null = null;

/** How often an open app asks whether there is a newer version. */
const LOOK_EVERY_MS = 3_600_000;

/** Registers `/sw.js` for the field app and watches for a newer one. */
function register(): Signal<ServiceWorkerUpdate> {
  const worker = new Workbox('/sw.js', { scope: '/field', updateViaCache: 'none' });
  let asked = false;
  const signal = createSignal<ServiceWorkerUpdate>({ offered: false, update: () => undefined });
  worker.addEventListener('waiting', () => {
    const apply = () => {
      asked = true;
      worker.messageSkipWaiting();
    };
    signal.set({ offered: true, update: apply });
  });
  worker.addEventListener('controlling', () => {
    // Another tab may have pressed update; this one goes on with its old shell, which the worker still serves.
    if (asked) window.location.reload();
  });
  void worker.register().catch(() => undefined);
  setInterval(() => void worker.update().catch(() => undefined), LOOK_EVERY_MS);
  return signal;
}

/** The update offer of this page; registers the service worker at the first call. Only in the browser. */
export function browserWorkerUpdate(): Signal<ServiceWorkerUpdate> {
  const able = 'serviceWorker' in navigator && process.env.NODE_ENV === 'production';
  update ??= able ? register() : createSignal<ServiceWorkerUpdate>({ offered: false, update: () => undefined });
  return update;
}
