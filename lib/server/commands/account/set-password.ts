import 'server-only';
import { Op, type Transaction } from 'sequelize';
import { hashPassword } from '@/lib/server/auth/password';
import { passwordFault } from '@/lib/server/auth/password-rules';
import { homeTeam } from '@/lib/server/auth/session-rows';
import { asTeamContext, type TeamContext } from '@/lib/server/auth/team-context';
import { lockCounter, saveCounter } from '@/lib/server/commands/push/lock-counter';
import { writeAudit } from '@/lib/server/commands/push/write-audit';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { publicUrl } from '@/lib/server/env';
import { HttpProblem } from '@/lib/server/http/problem';
import { passwordChangedLetter } from '@/lib/server/mail/letter-words';
import { type NotedLetter, noteLetter, sendLetter } from '@/lib/server/mail/send-letter';
import { type AccountOwner, type OwnTeam, passwordOwner } from './account-owner';

/** A new password for an account, and why it may be set. */
export interface PasswordChange {
  owner: AccountOwner;
  password: string;
  /** The word in the audit chain. */
  action: 'password.change' | 'password.reset';
  /** The sign-in that goes on; all others end. */
  keepSession: string | null;
  /** Uses up what allows the change, in its transaction. @throws HttpProblem when it is used up already. */
  claim(transaction: Transaction): Promise<void>;
}

/** The team context of the account's owner, who has shown who they are by password or link. */
function ownerContext({ userId, name }: AccountOwner, team: OwnTeam): TeamContext {
  return asTeamContext({
    teamId: team.id,
    userId,
    sessionId: null,
    // The context only names whose chain is written; no right is asked of it.
    role: 'researcher',
    displayName: name,
    teamName: team.name,
    zone: team.zone,
  });
}

async function endOtherSessions(
  { owner, keepSession }: PasswordChange,
  nowMs: number,
  transaction: Transaction,
): Promise<void> {
  const others = keepSession === null ? {} : { id: { [Op.ne]: toBinary(keepSession) } };
  await database().models.Session.update(
    { revoked_at: new Date(nowMs) },
    { where: { user_id: toBinary(owner.userId), revoked_at: null, ...others }, transaction },
  );
}

async function noteNotice(owner: AccountOwner, nowMs: number, transaction: Transaction): Promise<NotedLetter | null> {
  const [team] = owner.teams;
  if (!team) return null;
  const letter = passwordChangedLetter({ team, atMs: nowMs, resetHref: `${publicUrl()}/reset` });
  const note = { teamId: team.id, recipient: owner.email, letter, kind: 'password-changed' as const };
  return noteLetter({ ...note, subjectId: owner.userId, nowMs }, transaction);
}

/** Sets the password and writes it down in the chain of every team of the owner, whose counters are locked in order. */
async function change(
  given: PasswordChange & { passwordHash: string },
  nowMs: number,
  transaction: Transaction,
): Promise<NotedLetter | null> {
  const { owner, action, passwordHash } = given;
  const locked = [];
  for (const team of owner.teams) {
    const ctx = ownerContext(owner, team);
    locked.push({ ctx, counter: await lockCounter(ctx, transaction) });
  }
  await given.claim(transaction);
  const where = { id: toBinary(owner.userId) };
  await database().models.User.update({ password_hash: passwordHash }, { where, transaction });
  await endOtherSessions(given, nowMs, transaction);
  for (const { ctx, counter } of locked) {
    const event = { action, subjectId: owner.userId, detail: {}, at: new Date(nowMs) };
    await writeAudit({ ctx, counter, transaction }, event);
    await saveCounter(ctx, counter, transaction);
  }
  return noteNotice(owner, nowMs, transaction);
}

/**
 * Gives an account another password, ends its sign-ins, and tells the owner by letter.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `password-length`, `common`, or what `claim` throws.
 */
export async function setPassword(given: PasswordChange, nowMs: number): Promise<void> {
  const fault = passwordFault(given.password, passwordOwner(given.owner));
  if (fault) throw new HttpProblem(fault);
  const passwordHash = await hashPassword(given.password);
  const noted = await inTransaction((transaction) => change({ ...given, passwordHash }, nowMs, transaction));
  if (noted) await sendLetter(noted);
}

/** The team whose name and clock stand in a letter about the account: the one its owner was last in. */
export async function letterTeam({ userId, teams }: AccountOwner): Promise<OwnTeam | null> {
  const home = await homeTeam(userId);
  return teams.find((team) => team.id === home) ?? null;
}
