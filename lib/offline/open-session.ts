import { ME_ANSWER } from './answer-shapes';
import { askOffice } from './ask-office';
import {
  type DeviceDatabase,
  type KnownPerson,
  lastPerson,
  leavingKey,
  noteLeft,
  personKey,
  rememberPerson,
} from './device-database';
import { type Network, REQUEST_TIMEOUT_MS } from './network';
import type { PhoneClock } from './phone-clock';
import type { Person } from './session-view';
import { signOutAtOffice } from './sign-out';

/** Whose records to open, and what the office said. */
export type Opening =
  /** The office knows this person; `before` is what the phone knew of them, with their former role. */
  | { kind: 'confirmed'; person: KnownPerson; formerRole: Person['role'] | null }
  /** No answer: the last person goes on. */
  | { kind: 'offline'; person: KnownPerson }
  /** The session has run out: the last person goes on recording, and signs in before anything is sent. */
  | { kind: 'expired'; person: KnownPerson }
  | { kind: 'nobody'; reachable: boolean };

/** What asking needs. */
export interface OpeningPorts {
  network: Network;
  clock: PhoneClock;
  device: DeviceDatabase;
}

/** Who the office says is signed in: a person, null for nobody, undefined when it does not answer. */
async function whoIsSignedIn(ports: OpeningPorts): Promise<Person | null | undefined> {
  const request = { method: 'GET', path: '/api/me', timeoutMs: REQUEST_TIMEOUT_MS } as const;
  const { verdict } = await askOffice(ports, request, ME_ANSWER);
  if (verdict.kind === 'sign-in') return null;
  if (verdict.kind !== 'ok') return undefined;
  const { user, team, role, members } = verdict.value;
  const { id: teamId, name: teamName, zone } = team;
  return { teamId, teamName, zone, userId: user.id, displayName: user.name, role, members };
}

/** Ends the session of a person who left this phone with no signal. Somebody else's session is left alone. */
async function finishLeaving(
  ports: OpeningPorts,
  signedIn: Person | null | undefined,
): Promise<Person | null | undefined> {
  const leaving = await leavingKey(ports.device);
  if (!signedIn || leaving === null) return signedIn;
  if (leaving === personKey(signedIn) && !(await signOutAtOffice(ports.network))) return undefined;
  await noteLeft(ports.device);
  return leaving === personKey(signedIn) ? null : signedIn;
}

/**
 * Finds out whose records to open. The office decides who is signed in; without it the last person of this phone goes
 * on. Somebody else's records are never opened: each person has a database of their own.
 */
export async function openSession(ports: OpeningPorts): Promise<Opening> {
  const last = await lastPerson(ports.device);
  const signedIn = await finishLeaving(ports, await whoIsSignedIn(ports));
  if (signedIn) {
    const former = await ports.device.people.get(personKey(signedIn));
    const person = await rememberPerson(ports.device, signedIn);
    return { kind: 'confirmed', person, formerRole: former?.role ?? null };
  }
  if (!last) return { kind: 'nobody', reachable: signedIn === null };
  return { kind: signedIn === null ? 'expired' : 'offline', person: last };
}
