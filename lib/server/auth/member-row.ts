import 'server-only';
import { isRole } from './role';
import { type TeamContext, asTeamContext } from './team-context';

/** One membership joined with its user and team, as the database gives it. */
export interface MemberRow {
  role: string;
  displayName: string;
  teamName: string;
  zone: string;
}

/** Who a row is about. */
interface MemberIds {
  teamId: string;
  userId: string;
  sessionId: string | null;
}

/** Columns of `MemberRow`, for a query whose tables are `memberships m`, `users u` and `teams t`. */
export const MEMBER_COLUMNS = 'm.role AS role, u.display_name AS displayName, t.name AS teamName, t.zone AS zone';

/** The context of a membership row; null for a role word this version does not know. */
export function contextOfRow(row: MemberRow, ids: MemberIds): TeamContext | null {
  const { role, displayName, teamName, zone } = row;
  return isRole(role) ? asTeamContext({ ...ids, role, displayName, teamName, zone }) : null;
}
