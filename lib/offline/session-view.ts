/** The five roles a person may have in a team. */
export type Role = 'technician' | 'reviewer' | 'biologist' | 'coordinator' | 'researcher';

/** A person of the team, as other people see them. */
export interface Member {
  id: string;
  name: string;
}

/** Whose records this phone has open. */
export interface Person {
  teamId: string;
  teamName: string;
  userId: string;
  displayName: string;
  role: Role;
  /** IANA zone of the team, for local dates. */
  zone: string;
  members: Member[];
}

/** Who uses the field app right now. */
export type SessionView =
  | { kind: 'loading' }
  /** Nobody is known on this phone. `reachable` says whether the office answered just now. */
  | { kind: 'signed-out'; reachable: boolean }
  /** Open for work, with or without signal. */
  | { kind: 'ready'; person: Person; enrolled: boolean; storageCleared: boolean }
  /** Open for work, but the office wants this same person to sign in before anything is sent. */
  | { kind: 'needs-sign-in'; person: Person; enrolled: boolean; storageCleared: boolean };
