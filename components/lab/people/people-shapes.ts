import type { RoleName } from '@/components/shell/role-words';

/** A person of the team, as the pages are given them. Instants are ISO 8601 UTC. */
export interface MemberView {
  id: string;
  name: string;
  email: string;
  role: RoleName;
  sessions: number;
  lastSeenAt: string | null;
  endedAt: string | null;
}

/** An invitation nobody has answered. */
export interface InvitationView {
  id: string;
  email: string;
  role: RoleName;
  expiresAt: string;
  expired: boolean;
  sent: boolean;
}

/** Where letters go on this server. */
export type LetterBoxView = 'mail' | 'kept' | 'none';

/** How times are told on a page: the team's zone and the reader's year. */
export interface TimeView {
  zone: string;
  /** A date of this year is told without it. */
  today: string;
}
