'use client';
import type { ServiceWorkerUpdate } from '@/lib/offline/service-worker-update';
/** Registers /sw.js for /field and tells when a new version waits. Never reloads by itself. `update()` always obeys the press; hide the offer while a recorder is open. */
export declare function useServiceWorkerUpdate(): ServiceWorkerUpdate;
