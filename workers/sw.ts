import { clientsClaim } from 'workbox-core';
import {
  type PrecacheEntry,
  cleanupOutdatedCaches,
  createHandlerBoundToURL,
  precacheAndRoute,
} from 'workbox-precaching';
import { NavigationRoute, registerRoute } from 'workbox-routing';
import { WAKE_TAG } from '@/lib/offline/background-wake';
import { drainInBackground } from '@/lib/offline/drain-in-background';
import { answerFromEarlierShell, forgetEarlierShell, isBuiltFile, keepEarlierShell } from './earlier-shell';

declare const self: ServiceWorkerGlobalScope & { __WB_MANIFEST: (PrecacheEntry | string)[] };

/** Every path of the phone app is the one page that was built ahead. */
const FIELD_PATHS = /^\/field(?:\/|$)/;

// Before the new files are stored, so that a page of the version before still finds its own.
self.addEventListener('install', (event) => event.waitUntil(keepEarlierShell()));

self.addEventListener('fetch', (event) => {
  if (event.request.mode === 'navigate') event.waitUntil(forgetEarlierShell(self.clients));
});

precacheAndRoute(self.__WB_MANIFEST, {
  cleanURLs: false,
  directoryIndex: '',
  ignoreURLParametersMatching: [/^utm_/, /^dpl$/],
});
cleanupOutdatedCaches();
registerRoute(new NavigationRoute(createHandlerBoundToURL('/field'), { allowlist: [FIELD_PATHS] }));
registerRoute(({ url, sameOrigin }) => sameOrigin && isBuiltFile(url), answerFromEarlierShell);

// The new version takes over when a person asks for it, never by itself: somebody may be reading a comb.
self.addEventListener('message', (event) => {
  const data: unknown = event.data;
  if (typeof data === 'object' && data !== null && 'type' in data && data.type === 'SKIP_WAITING')
    void self.skipWaiting();
});
clientsClaim();

/** The event of Background Sync, which not every browser has. */
interface WakeEvent extends ExtendableEvent {
  tag: string;
}

function isWake(event: Event): event is WakeEvent {
  return 'tag' in event && event.tag === WAKE_TAG;
}

// A rejected event asks the browser to wake this worker again later.
self.addEventListener('sync', (event) => {
  if (!isWake(event)) return;
  const sent = drainInBackground().then((done) => (done ? undefined : Promise.reject(new Error('something is left'))));
  event.waitUntil(sent);
});
