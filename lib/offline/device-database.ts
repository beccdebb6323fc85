import { Dexie, type DexieOptions, type Table } from 'dexie';
import type { Person } from './session-view';

/** A person this phone knows, and the device they were enrolled as. */
export interface KnownPerson extends Person {
  /** `<teamId>-<userId>` */
  key: string;
  deviceId: string | null;
  /** The office's secret for this device. */
  deviceKey: string | null;
  /** The sentinel of this person's records; when theirs is another one, the browser has emptied them. */
  sentinel: string | null;
}

/** `signed-in`: who uses the phone. `signing-out`: whose session still has to be ended at the office. */
interface Pointer {
  id: 'signed-in' | 'signing-out';
  key: string;
}

/** The small database that outlives a sign-out: who uses this phone, and as which device. */
export class DeviceDatabase extends Dexie {
  declare people: Table<KnownPerson, string>;
  declare pointers: Table<Pointer, string>;

  /** @param options another IndexedDB implementation, for tests. */
  constructor(options: DexieOptions = {}) {
    super('undereave-device', { ...options, chromeTransactionDurability: 'strict' });
    this.version(1).stores({ people: 'key', pointers: 'id' });
  }
}

/** The key of a person on this phone. */
export function personKey({ teamId, userId }: Pick<Person, 'teamId' | 'userId'>): string {
  return `${teamId}-${userId}`;
}

/** The person whose records this phone opened last and nobody has signed out since. */
export async function lastPerson(db: DeviceDatabase): Promise<KnownPerson | null> {
  const last = await db.pointers.get('signed-in');
  return (last && (await db.people.get(last.key))) ?? null;
}

/** Keeps what the office says about a person and makes them the one who uses this phone. */
export function rememberPerson(db: DeviceDatabase, person: Person): Promise<KnownPerson> {
  return db.transaction('rw', [db.people, db.pointers], async () => {
    const key = personKey(person);
    const unknown = { deviceId: null, deviceKey: null, sentinel: null };
    const known = { ...unknown, ...(await db.people.get(key)), ...person, key };
    await db.people.put(known);
    await db.pointers.put({ id: 'signed-in', key });
    return known;
  });
}

/** Notes the device or the sentinel of a person. */
export async function noteOfPerson(
  db: DeviceDatabase,
  person: Person,
  note: Partial<Pick<KnownPerson, 'deviceId' | 'deviceKey' | 'sentinel'>>,
): Promise<void> {
  await db.people.update(personKey(person), note);
}

/** Nobody uses this phone any more. Their records and their device stay; their session is still to be ended. */
export function leavePhone(db: DeviceDatabase, person: Person): Promise<void> {
  return db.transaction('rw', [db.pointers], async () => {
    await db.pointers.delete('signed-in');
    await db.pointers.put({ id: 'signing-out', key: personKey(person) });
  });
}

/** The key of the person whose session is still to be ended at the office; null when there is none. */
export async function leavingKey(db: DeviceDatabase): Promise<string | null> {
  return (await db.pointers.get('signing-out'))?.key ?? null;
}

/** The session was ended, or someone else has begun one. */
export async function noteLeft(db: DeviceDatabase): Promise<void> {
  await db.pointers.delete('signing-out');
}

/** Nobody uses this phone any more, and it forgets this person. Their session is still to be ended. */
export function forgetPerson(db: DeviceDatabase, person: Person): Promise<void> {
  return db.transaction('rw', [db.pointers, db.people], async () => {
    const key = personKey(person);
    await db.people.delete(key);
    await db.pointers.delete('signed-in');
    await db.pointers.put({ id: 'signing-out', key });
  });
}
