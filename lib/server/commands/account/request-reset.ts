import 'server-only';
import { takeAllowance } from '@/lib/server/auth/allowance';
import { newSecretLink } from '@/lib/server/auth/secret-link';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { publicUrl } from '@/lib/server/env';
import { resetLetter } from '@/lib/server/mail/letter-words';
import { noteLetter, sendLetter } from '@/lib/server/mail/send-letter';
import { type AccountOwner, accountOwner } from './account-owner';
import { inBackground } from './background';
import { letterTeam } from './set-password';

/** A link to a new password works this long. */
const RESET_MS = 60 * 60_000;

/** Letters one address gets in an hour, and questions one caller may ask in a minute. */
const PER_EMAIL = { most: 5, perMs: 60 * 60_000 };
const PER_ADDRESS = { most: 60, perMs: 60_000 };

async function sendReset(owner: AccountOwner, nowMs: number): Promise<void> {
  const team = await letterTeam(owner);
  if (!team) return;
  const { token, hash } = newSecretLink();
  const untilMs = nowMs + RESET_MS;
  const letter = resetLetter({ team, link: `${publicUrl()}/reset/${token}`, untilMs });
  const noted = await inTransaction(async (transaction) => {
    const { ResetToken } = database().models;
    const user_id = toBinary(owner.userId);
    // Only the newest letter's link works; rows of older ones serve nothing.
    await ResetToken.destroy({ where: { user_id }, transaction });
    const row = { token_hash: hash, user_id, expires_at: new Date(untilMs), used_at: null };
    await ResetToken.create(row, { transaction });
    const note = { teamId: team.id, recipient: owner.email, letter, kind: 'reset' as const };
    return noteLetter({ ...note, subjectId: owner.userId, nowMs }, transaction);
  });
  await sendLetter(noted);
}

async function writeTo(email: string, nowMs: number): Promise<void> {
  const user = await database().models.User.findOne({ where: { email } });
  const owner = user && (await accountOwner(fromBinary(user.id)));
  if (owner) await sendReset(owner, nowMs);
}

/**
 * Sends a link to a new password to an address that has an account in a team. Whether it has one nobody is told: the
 * answer is the same, and is given before the account is looked for.
 *
 * @throws HttpProblem `too-many`, alike for addresses that nobody has.
 */
export async function requestReset(
  { email, address }: { email: string; address: string },
  nowMs: number,
): Promise<Record<string, never>> {
  await takeAllowance({ subject: `reset-from:${address}`, ...PER_ADDRESS }, nowMs);
  await takeAllowance({ subject: `reset:${email}`, ...PER_EMAIL }, nowMs);
  inBackground('reset', () => writeTo(email, nowMs));
  return {};
}
