import { v7 } from 'uuid';
import type { Role } from '@/lib/server/auth/role';
import { hashPassword } from '@/lib/server/auth/password';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** The password of test accounts. */
export const PASSWORD = 'seventeen grey kettles';

/** An account somebody can sign in to. */
export interface Account {
  userId: string;
  email: string;
}

/** Makes an account with `PASSWORD`, a member of a team when one is given. */
export async function makeAccount(teamId: string | null, role: Role = 'technician'): Promise<Account> {
  const userId = v7();
  const email = `${userId}@test.example`;
  const { User, Membership } = database().models;
  const password_hash = await hashPassword(PASSWORD);
  await User.create({ id: toBinary(userId), email, display_name: 'Senna', password_hash, disabled_at: null });
  if (teamId !== null) await Membership.create({ team_id: toBinary(teamId), user_id: toBinary(userId), role });
  return { userId, email };
}
