'use client';

import { useSyncExternalStore } from 'react';
import { browserWorkerUpdate } from '@/lib/offline/browser-worker-update';
import type { ServiceWorkerUpdate } from '@/lib/offline/service-worker-update';

const NONE: ServiceWorkerUpdate = { offered: false, update: () => undefined };

function subscribe(listener: () => void): () => void {
  return browserWorkerUpdate().subscribe(listener);
}

/**
 * Registers the service worker and tells when a newer version of the app waits. Nothing reloads by itself: `update` is
 * the person's press. Hide the offer while a recorder is open.
 */
export function useServiceWorkerUpdate(): ServiceWorkerUpdate {
  return useSyncExternalStore(
    subscribe,
    () => browserWorkerUpdate().get(),
    () => NONE,
  );
}
