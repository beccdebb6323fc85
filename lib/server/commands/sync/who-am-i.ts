import 'server-only';
import { QueryTypes } from 'sequelize';
import type { MeResponse } from '@/lib/protocol/me';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';

/** Who is signed in, and the names of the team that stand beside its records. */
export async function whoAmI(ctx: TeamContext, nowMs: number): Promise<MeResponse> {
  const { userId, displayName, teamId, teamName, zone, role } = ctx;
  const rows = await database().sequelize.query<{ id: Buffer; name: string }>(
    `SELECT u.id AS id, u.display_name AS name FROM memberships m JOIN users u ON u.id = m.user_id
     WHERE m.team_id = ? ORDER BY u.display_name, u.id`,
    { type: QueryTypes.SELECT, replacements: [toBinary(teamId)] },
  );
  return {
    user: { id: userId, name: displayName },
    team: { id: teamId, name: teamName, zone },
    role,
    members: rows.map(({ id, name }) => ({ id: fromBinary(id), name })),
    serverTime: new Date(nowMs).toISOString(),
  };
}
