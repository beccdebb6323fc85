import { v7 } from 'uuid';
import { newSecretLink } from '@/lib/server/auth/secret-link';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** An unanswered invitation whose link nobody has; returns its id. */
export async function makeInvitation(teamId: string, canary = ''): Promise<string> {
  const id = v7();
  await database().models.Invitation.create({
    team_id: toBinary(teamId),
    id: toBinary(id),
    email: `${id}${canary}@test.example`,
    role: 'technician',
    invited_by: null,
    token_hash: newSecretLink().hash,
    invited_at: new Date(0),
    expires_at: new Date(8.64e12),
    accepted_at: null,
    withdrawn_at: null,
  });
  return id;
}
