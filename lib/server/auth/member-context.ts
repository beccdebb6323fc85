import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { MEMBER_COLUMNS, type MemberRow, contextOfRow } from './member-row';
import type { TeamContext } from './team-context';

/**
 * The context of a member without a session, for command-line tools that act in a person's name.
 *
 * @throws when the person is not a member of the team.
 */
export async function memberContext(teamId: string, userId: string): Promise<TeamContext> {
  const rows = await database().sequelize.query<MemberRow>(
    `SELECT ${MEMBER_COLUMNS} FROM memberships m JOIN users u ON u.id = m.user_id JOIN teams t ON t.id = m.team_id
     WHERE m.team_id = ? AND m.user_id = ? AND m.ended_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: [toBinary(teamId), toBinary(userId)] },
  );
  const context = rows[0] ? contextOfRow(rows[0], { teamId, userId, sessionId: null }) : null;
  if (!context) throw new Error(`User ${userId} is not a member of team ${teamId}.`);
  return context;
}
