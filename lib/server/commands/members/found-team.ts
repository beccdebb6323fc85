import 'server-only';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { freshLink } from './write-invitation';

/** A team to be made. */
export interface NewTeam {
  name: string;
  /** IANA zone. */
  zone: string;
  /** Where the first coordinator reads mail, in the spelling accounts are looked up by. */
  email: string;
}

/**
 * Makes an empty team with an invitation for its first coordinator. Asked by whoever runs the server, who hands the
 * link on; nothing is sent.
 *
 * @param nowMs epoch milliseconds.
 * @returns the link, which works once, for seven days.
 */
export async function foundTeam(
  { name, zone, email }: NewTeam,
  nowMs: number,
): Promise<{ teamId: string; link: string }> {
  const teamId = newId();
  const link = freshLink(nowMs);
  const team_id = toBinary(teamId);
  await inTransaction(async (transaction) => {
    const { Team, TeamCounter, Invitation } = database().models;
    await Team.create({ id: team_id, name, zone, home_lat: null, home_lon: null }, { transaction });
    const counter = { team_id, seq: 0, safe_seq: 0, audit_seq: 0, audit_hash: Buffer.alloc(32) };
    await TeamCounter.create(counter, { transaction });
    await Invitation.create(
      {
        team_id,
        id: toBinary(newId()),
        email,
        role: 'coordinator',
        invited_by: null,
        token_hash: link.hash,
        invited_at: new Date(nowMs),
        expires_at: link.expiresAt,
        accepted_at: null,
        withdrawn_at: null,
      },
      { transaction },
    );
  });
  return { teamId, link: link.href };
}
