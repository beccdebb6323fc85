import 'server-only';
import { Op, type Transaction } from 'sequelize';
import { type PasswordProof, checkPassword } from '@/lib/server/auth/check-password';
import { secondsToWait } from '@/lib/server/auth/login-throttle';
import { type OpenInvitation, openInvitation } from '@/lib/server/auth/open-invitation';
import { hashPassword } from '@/lib/server/auth/password';
import { passwordFault } from '@/lib/server/auth/password-rules';
import { tokenHash } from '@/lib/server/auth/secret-link';
import { asTeamContext } from '@/lib/server/auth/team-context';
import { teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { isDuplicateKey } from '@/lib/server/db/database-errors';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';

/** The answer to an invitation. */
export interface InvitationAnswer {
  token: string;
  /** Null for a person who has an account. */
  name: string | null;
  /** A new password, or the account's own. */
  password: string;
  address: string;
}

/** Who joins: an account there is, or one to be made. */
type Joiner =
  | { kind: 'account'; userId: string; proof: PasswordProof }
  | { kind: 'new'; userId: string; name: string; passwordHash: string };

/**
 * Whoever has an account shows that it is theirs with its password. The link alone would let the team that wrote it
 * reach into an account that belongs to other teams too.
 */
async function provenAccount(email: string, answer: InvitationAnswer, nowMs: number): Promise<Joiner> {
  const { password, address } = answer;
  const seconds = await secondsToWait({ email, address }, nowMs);
  if (seconds > 0) throw new HttpProblem('too-many', { headers: { 'Retry-After': String(seconds) } });
  const proof = await checkPassword({ email, password, address }, nowMs);
  if (!proof) throw new HttpProblem('wrong-password');
  return { kind: 'account', userId: proof.userId, proof };
}

async function newAccount({ email, teamName }: OpenInvitation, answer: InvitationAnswer): Promise<Joiner> {
  const { name, password } = answer;
  if (name === null) throw new HttpProblem('shape');
  const fault = passwordFault(password, { email, name, teams: [teamName] });
  if (fault) throw new HttpProblem(fault);
  return { kind: 'new', userId: newId(), name, passwordHash: await hashPassword(password) };
}

/** Closes the invitation for everybody who comes after. @throws HttpProblem `link-closed` when somebody came before. */
async function claim({ teamId, id }: OpenInvitation, answer: InvitationAnswer, on: Write): Promise<void> {
  const { transaction, nowMs } = on;
  const row = await database().models.Invitation.findOne({
    where: {
      team_id: toBinary(teamId),
      id: toBinary(id),
      token_hash: tokenHash(answer.token) ?? Buffer.alloc(0),
      accepted_at: null,
      withdrawn_at: null,
      expires_at: { [Op.gt]: new Date(nowMs) },
    },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!row) throw new HttpProblem('link-closed');
  await row.update({ accepted_at: new Date(nowMs) }, { transaction });
}

interface Write {
  transaction: Transaction;
  nowMs: number;
}

async function makeAccount(email: string, joiner: Joiner, transaction: Transaction): Promise<void> {
  if (joiner.kind !== 'new') return;
  const { userId, name, passwordHash } = joiner;
  const account = { id: toBinary(userId), email, display_name: name, password_hash: passwordHash, disabled_at: null };
  try {
    await database().models.User.create(account, { transaction });
  } catch (error) {
    // Another team's invitation to the same address was answered this moment: now the account is there to be proven.
    if (isDuplicateKey(error)) throw new HttpProblem('busy');
    throw error;
  }
}

/** Makes the person a member, or a member again. @throws HttpProblem `member` when they are one. */
async function join({ teamId, role }: OpenInvitation, userId: string, transaction: Transaction): Promise<void> {
  const { Membership } = database().models;
  const key = { team_id: toBinary(teamId), user_id: toBinary(userId) };
  const former = await Membership.findOne({ where: key, transaction, lock: transaction.LOCK.UPDATE });
  if (!former) await Membership.create({ ...key, role }, { transaction });
  else if (former.ended_at === null) throw new HttpProblem('member');
  else await former.update({ role, ended_at: null }, { transaction });
}

/**
 * Answers an invitation: makes the account when there is none, and the membership. However many answers come at once,
 * one gets through.
 *
 * @param nowMs epoch milliseconds.
 * @returns the e-mail to sign in with.
 * @throws HttpProblem `link-closed` for every link that does not work (any more); `password-length` or `common` for a
 * new password; `wrong-password` or `too-many` for the account's own.
 */
export async function acceptInvitation(answer: InvitationAnswer, nowMs: number): Promise<{ email: string }> {
  const open = await openInvitation(answer.token, nowMs);
  if (!open) throw new HttpProblem('link-closed');
  const { teamId, id, email, role, teamName } = open;
  const joiner = open.hasAccount ? await provenAccount(email, answer, nowMs) : await newAccount(open, answer);
  const { userId } = joiner;
  // The link, and the password of an account, have just shown who this is; the membership is made in the same step.
  const ctx = asTeamContext({ teamId, userId, sessionId: null, role, displayName: '', teamName, zone: 'UTC' });
  await teamAct(ctx, nowMs, async (transaction) => {
    await claim(open, answer, { transaction, nowMs });
    await makeAccount(email, joiner, transaction);
    await join(open, userId, transaction);
    return { result: null, event: { action: 'member.join', subjectId: id, detail: { role } } };
  });
  if (joiner.kind === 'account') await joiner.proof.succeeded();
  return { email };
}
