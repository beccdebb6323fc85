import { browserClock, browserTimers } from './browser-clock-edge';
import { browserWebLock } from './browser-web-lock';
import { DeviceDatabase, lastPerson, noteOfPerson } from './device-database';
import { RecordsDatabase, recordsName } from './dexie-database';
import { dexieStore } from './dexie-store';
import { createDrain } from './drain';
import { httpNetwork } from './http-network';
import { watchStore } from './watch-store';

/**
 * One pass of the drain without any page, for a service worker that the browser has woken because the network is back.
 *
 * @returns false when something is left that a later wake-up could send.
 */
export async function drainInBackground(): Promise<boolean> {
  const device = new DeviceDatabase();
  const person = await lastPerson(device);
  if (!person) return true;
  const db = new RecordsDatabase(recordsName(person.teamId, person.userId));
  try {
    const drain = createDrain({
      store: watchStore(dexieStore(db), browserTimers),
      clock: browserClock,
      timers: browserTimers,
      network: httpNetwork,
      holder: browserClock.boot(),
      lock: browserWebLock(db.name),
      label: '',
      // A phone is enrolled by its page, where a person is.
      enrols: false,
      report: () => undefined,
      keepDevice: (keys) => noteOfPerson(device, person, keys),
    });
    const end = await drain({ all: false });
    return end.kind !== 'again' && end.kind !== 'elsewhere';
  } finally {
    db.close();
    device.close();
  }
}
