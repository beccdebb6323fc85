/** The name under which a page asks the browser to wake the service worker when the network is back. */
export const WAKE_TAG = 'undereave-outbox';

/** What browsers with Background Sync add to a registration. */
interface SyncRegistration {
  sync: { register(tag: string): Promise<void> };
}

function canWake(registration: object): registration is SyncRegistration {
  return 'sync' in registration;
}

/**
 * Asks the browser to wake the service worker once there is network, also after the app was closed. An extra: the page
 * sends by itself while it is open, and most browsers cannot do this.
 */
export async function askForWake(): Promise<void> {
  const registration = await navigator.serviceWorker?.getRegistration('/field');
  if (registration && canWake(registration)) await registration.sync.register(WAKE_TAG);
}
