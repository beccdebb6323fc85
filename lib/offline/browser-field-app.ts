import { liveQuery } from 'dexie';
import { askForWake } from './background-wake';
import { browserClock, browserId, browserRandom, browserTimers } from './browser-clock-edge';
import { browserSha256 } from './browser-sha256';
import { browserWebLock } from './browser-web-lock';
import { DeviceDatabase, lastPerson } from './device-database';
import { FieldSession } from './field-session';
import { httpNetwork } from './http-network';

let session: FieldSession | null = null;

/** What the office shows as this phone's name. */
function phoneLabel(): string {
  const { userAgent } = navigator;
  const system = ['Android', 'iPhone', 'iPad', 'Windows', 'Mac', 'Linux'].find((name) => userAgent.includes(name));
  return system ?? 'Browser';
}

/** Wakes the app when the network or the person comes back. */
function listen(app: FieldSession): void {
  window.addEventListener('online', () => app.standing.get().records?.wake('online'));
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState !== 'visible') return;
    const { records, view } = app.standing.get();
    void records?.resume().catch(() => undefined);
    if (view.kind !== 'ready') void app.refresh();
  });
}

/** Closes and opens records as other tabs of the phone are left and come to. */
function followOtherTabs(app: FieldSession): void {
  const device = new DeviceDatabase();
  liveQuery(() => lastPerson(device)).subscribe({
    next: () => void app.follow().catch(() => undefined),
    error: () => undefined,
  });
}

/** The field app of this page, made and started at the first call. Only in the browser. */
export function browserFieldApp(): FieldSession {
  if (session) return session;
  session = new FieldSession({
    clock: browserClock,
    timers: browserTimers,
    random: browserRandom,
    network: httpNetwork,
    sha256: browserSha256,
    newId: browserId,
    webLock: browserWebLock,
    askForWake,
    page: browserClock.boot(),
    label: phoneLabel(),
  });
  listen(session);
  followOtherTabs(session);
  void session.start().catch(() => undefined);
  return session;
}
