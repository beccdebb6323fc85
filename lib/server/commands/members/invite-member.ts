import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { takeAllowance } from '@/lib/server/auth/allowance';
import type { Role } from '@/lib/server/auth/role';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { type LetterStanding, sendLetter } from '@/lib/server/mail/send-letter';
import { freshLink, noteInvitation } from './write-invitation';

/** Letters one team may have sent in an hour: a team is invited in a minute, a flood of letters takes longer. */
const LETTERS_PER_HOUR = 60;
const HOUR_MS = 60 * 60_000;

/** What an invitation came to. */
export interface Invited {
  id: string;
  letter: LetterStanding;
}

/** Counts a letter of the team. @throws HttpProblem `too-many` */
export async function countInvitation(ctx: TeamContext, nowMs: number): Promise<void> {
  await takeAllowance({ subject: `invite:${ctx.teamId}`, most: LETTERS_PER_HOUR, perMs: HOUR_MS }, nowMs);
}

async function requireNew(ctx: TeamContext, email: string, transaction: Transaction): Promise<void> {
  const rows = await database().sequelize.query<{ code: 'member' | 'invited' }>(
    `SELECT 'member' AS code FROM memberships m JOIN users u ON u.id = m.user_id
     WHERE m.team_id = :team AND m.ended_at IS NULL AND u.email = :email
     UNION ALL
     SELECT 'invited' FROM invitations i
     WHERE i.team_id = :team AND i.email = :email AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: { team: toBinary(ctx.teamId), email }, transaction },
  );
  if (rows[0]) throw new HttpProblem(rows[0].code);
}

/**
 * Asks somebody into the team by letter.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `member`, `invited` when an invitation stands already (also one that has run out: it can be sent
 * again), or `too-many`.
 */
export async function inviteMember(
  ctx: TeamContext,
  { email, role }: { email: string; role: Role },
  nowMs: number,
): Promise<Invited> {
  await countInvitation(ctx, nowMs);
  const id = newId();
  const noted = await teamAct(ctx, nowMs, async (transaction) => {
    await requireNew(ctx, email, transaction);
    const link = freshLink(nowMs);
    await database().models.Invitation.create(
      {
        team_id: toBinary(ctx.teamId),
        id: toBinary(id),
        email,
        role,
        invited_by: toBinary(ctx.userId),
        token_hash: link.hash,
        invited_at: new Date(nowMs),
        expires_at: link.expiresAt,
        accepted_at: null,
        withdrawn_at: null,
      },
      { transaction },
    );
    const team = { id: ctx.teamId, name: ctx.teamName, zone: ctx.zone };
    const note = { team, inviter: ctx.displayName, invitationId: id, email, role, link, nowMs };
    const result = await noteInvitation(note, transaction);
    return { result, event: { action: 'member.invite', subjectId: id, detail: { role } } };
  });
  return { id, letter: await sendLetter(noted) };
}
