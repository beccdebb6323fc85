import 'server-only';
import type { Role } from './role';

declare const checked: unique symbol;

/** What the server knows about who asks. */
export interface TeamMember {
  /** Lower-case UUID text; goes into every query. */
  teamId: string;
  userId: string;
  /** Null when no person is signed in: a command-line tool that acts for a member. */
  sessionId: string | null;
  role: Role;
  displayName: string;
  teamName: string;
  /** IANA zone of the team. */
  zone: string;
}

/**
 * Proof that the membership was read from the database for this request.
 * Queries and commands take it instead of a bare team id, so that no id from outside can choose the team.
 */
export type TeamContext = Readonly<TeamMember> & { readonly [checked]: true };

/** Marks a member as checked. Called only where the membership has just been read from the database. */
export function asTeamContext(member: TeamMember): TeamContext {
  return Object.freeze({ ...member }) as TeamContext;
}
