import 'server-only';
import { Op, type Transaction } from 'sequelize';
import { openReset } from '@/lib/server/auth/open-reset';
import { tokenHash } from '@/lib/server/auth/secret-link';
import { database } from '@/lib/server/db/database';
import { HttpProblem } from '@/lib/server/http/problem';
import { accountOwner } from './account-owner';
import { setPassword } from './set-password';

async function useUp(token: string, nowMs: number, transaction: Transaction): Promise<void> {
  const row = await database().models.ResetToken.findOne({
    where: { token_hash: tokenHash(token) ?? Buffer.alloc(0), used_at: null, expires_at: { [Op.gt]: new Date(nowMs) } },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!row) throw new HttpProblem('link-closed');
  await row.update({ used_at: new Date(nowMs) }, { transaction });
}

/**
 * Sets the password behind a link from a letter, once; every sign-in of the account ends. However many come at once,
 * one gets through.
 *
 * @throws HttpProblem `link-closed` for every link that does not work (any more), `password-length`, `common`.
 */
export async function resetPassword(
  { token, password }: { token: string; password: string },
  nowMs: number,
): Promise<{ email: string }> {
  const userId = await openReset(token, nowMs);
  const owner = userId && (await accountOwner(userId));
  if (!owner) throw new HttpProblem('link-closed');
  const claim = (transaction: Transaction) => useUp(token, nowMs, transaction);
  await setPassword({ owner, password, action: 'password.reset', keepSession: null, claim }, nowMs);
  return { email: owner.email };
}
