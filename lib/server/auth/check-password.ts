import 'server-only';
import { database } from '@/lib/server/db/database';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { recordAttempt } from './login-throttle';
import { verifyPassword } from './password';

/** What somebody typed, and where from. */
export interface PasswordAttempt {
  /** In the spelling accounts are looked up by. */
  email: string;
  password: string;
  address: string;
}

/** A password that was right. */
export interface PasswordProof {
  userId: string;
  /** Takes the attempt off the list of failures. */
  succeeded(): Promise<void>;
}

/**
 * Does the password belong to the e-mail? Written down as an attempt; unknown and disabled accounts take the time of
 * a wrong password. The caller has asked the throttle.
 */
export async function checkPassword(
  { email, password, address }: PasswordAttempt,
  nowMs: number,
): Promise<PasswordProof | null> {
  const succeeded = await recordAttempt({ email, address }, nowMs);
  const user = await database().models.User.findOne({ where: { email } });
  const matches = await verifyPassword(user?.password_hash ?? null, password);
  return user && matches && user.disabled_at === null ? { userId: fromBinary(user.id), succeeded } : null;
}
