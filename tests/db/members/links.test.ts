import { createHash } from 'node:crypto';
import { v7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { verifyPassword } from '@/lib/server/auth/password';
import { memberContext } from '@/lib/server/auth/member-context';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { backgroundDone } from '@/lib/server/commands/account/background';
import { requestReset } from '@/lib/server/commands/account/request-reset';
import { resetPassword } from '@/lib/server/commands/account/reset-password';
import { acceptInvitation } from '@/lib/server/commands/members/accept-invitation';
import { renewInvitation, withdrawInvitation } from '@/lib/server/commands/members/change-invitation';
import { endMembership, changeRole } from '@/lib/server/commands/members/change-member';
import { inviteMember } from '@/lib/server/commands/members/invite-member';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { type TestMailServer, startMailServer, tokenIn, unquoted } from '@/tests/support/members/letters';

const log = vi.hoisted(() => vi.fn());
vi.mock('@/lib/server/log/log', () => ({ log, describeError: () => ({}) }));

const NOW = Date.parse('2026-06-20T12:00:00Z');
const DAY_MS = 86_400_000;
const NEW_PASSWORD = 'eleven kestrels over gravel';

let mail: TestMailServer;
let team: TestTeam;
let coordinator: TeamContext;

beforeAll(async () => {
  mail = await startMailServer();
});

afterAll(() => mail.close());

beforeEach(async () => {
  vi.stubEnv('MAIL_URL', mail.url);
  mail.refuses = false;
  mail.received.length = 0;
  await database().models.LoginAttempt.destroy({ where: {} });
  team = await makeTeam();
  coordinator = await memberContext(team.teamId, team.members.coordinator.userId);
});

/** The code a call is refused with, or its answer. */
async function outcome<T>(call: Promise<T>): Promise<T | string> {
  try {
    return await call;
  } catch (error) {
    if (error instanceof HttpProblem) return error.code;
    throw error;
  }
}

function answer(token: string, more: { name?: string | null; password?: string } = {}) {
  return { token, name: 'Tobiah', password: NEW_PASSWORD, address: 'direct', ...more };
}

async function invited(role: 'technician' | 'reviewer' = 'technician', email = `${v7()}@test.example`) {
  const { id, letter } = await inviteMember(coordinator, { email, role }, NOW);
  expect(letter).toBe('sent');
  return { id, email, token: tokenIn(mail, 'invitation') };
}

async function auditOf(teamId: string): Promise<string[]> {
  const rows = await database().models.AuditEntry.findAll({ where: { team_id: toBinary(teamId) }, order: ['seq'] });
  return rows.map(({ action }) => action);
}

describe('an invitation', () => {
  it('makes an account and a membership with the role in it, once', async () => {
    const { email, token } = await invited('reviewer');
    expect(await acceptInvitation(answer(token), NOW + 1)).toEqual({ email });
    const user = await database().models.User.findOne({ where: { email }, rejectOnEmpty: true });
    expect(user.display_name).toBe('Tobiah');
    expect(await verifyPassword(user.password_hash, NEW_PASSWORD)).toBe(true);
    const where = { team_id: toBinary(team.teamId), user_id: user.id };
    const membership = await database().models.Membership.findOne({ where, rejectOnEmpty: true });
    expect([membership.role, membership.ended_at]).toEqual(['reviewer', null]);
    expect(await outcome(acceptInvitation(answer(token), NOW + 2))).toBe('link-closed');
    expect(await auditOf(team.teamId)).toEqual(['member.invite', 'member.join']);
  });

  it('lets one of 50 answers through that come at once', async () => {
    const { email, token } = await invited();
    const outcomes = await Promise.all(Array.from({ length: 50 }, () => outcome(acceptInvitation(answer(token), NOW))));
    expect(outcomes.filter((one) => typeof one === 'object')).toEqual([{ email }]);
    expect(outcomes.filter((one) => one === 'link-closed')).toHaveLength(49);
    expect(await database().models.User.count({ where: { email } })).toBe(1);
    expect(await auditOf(team.teamId)).toEqual(['member.invite', 'member.join']);
  }, 120_000);

  it('is stored as a hash, never as the link itself, and stands in no log line', async () => {
    const { id, token } = await invited();
    const row = await database().models.Invitation.findOne({ where: { id: toBinary(id) }, rejectOnEmpty: true });
    expect(row.token_hash).toEqual(createHash('sha256').update(token).digest());
    const everything = JSON.stringify([
      await database().models.Invitation.findAll({ raw: true }),
      await database().models.Letter.findAll({ raw: true }),
      await database().models.AuditEntry.findAll({ raw: true }),
      log.mock.calls,
    ]);
    expect(everything).not.toContain(token);
  });

  it('runs out after seven days, and works until then', async () => {
    const late = await invited();
    expect(await outcome(acceptInvitation(answer(late.token), NOW + 7 * DAY_MS))).toBe('link-closed');
    expect(await outcome(acceptInvitation(answer(late.token), NOW + 7 * DAY_MS - 1))).toEqual({ email: late.email });
  });

  it('that was withdrawn, mistyped or replaced by a newer letter answers like a used one', async () => {
    const withdrawn = await invited();
    await withdrawInvitation(coordinator, withdrawn.id, NOW);
    const renewed = await invited();
    await renewInvitation(coordinator, renewed.id, NOW);
    const changed = `${renewed.token.slice(0, -1)}${renewed.token.endsWith('A') ? 'B' : 'A'}`;
    for (const token of [withdrawn.token, renewed.token, changed, '', 'x'.repeat(10_000)]) {
      expect(await outcome(acceptInvitation(answer(token), NOW))).toBe('link-closed');
    }
    expect(await outcome(acceptInvitation(answer(tokenIn(mail, 'invitation')), NOW))).toEqual({ email: renewed.email });
    expect(await outcome(renewInvitation(coordinator, renewed.id, NOW))).toBe('link-closed');
    expect(await outcome(withdrawInvitation(coordinator, withdrawn.id, NOW))).toBe('link-closed');
  });

  it('is not written twice to one address, nor to a member', async () => {
    const { email } = await invited();
    expect(await outcome(inviteMember(coordinator, { email, role: 'reviewer' }, NOW))).toBe('invited');
    const member = await makeAccount(team.teamId);
    expect(await outcome(inviteMember(coordinator, { email: member.email, role: 'reviewer' }, NOW))).toBe('member');
  });

  it('tells a new person what is wrong with the password before anything is used up', async () => {
    const { token, email } = await invited();
    expect(await outcome(acceptInvitation(answer(token, { password: 'fourteen signs' }), NOW))).toBe('password-length');
    expect(await outcome(acceptInvitation(answer(token, { password: 'password password' }), NOW))).toBe('common');
    expect(await outcome(acceptInvitation(answer(token, { name: null }), NOW))).toBe('shape');
    expect(await outcome(acceptInvitation(answer(token), NOW))).toEqual({ email });
  });

  it('adds a team to an account only with the account’s own password, which stays', async () => {
    const other = await makeTeam({ name: 'Ossle' });
    const account = await makeAccount(other.teamId);
    const { token } = await invited('technician', account.email);
    expect(await outcome(acceptInvitation(answer(token), NOW))).toBe('wrong-password');
    expect(await acceptInvitation(answer(token, { name: null, password: PASSWORD }), NOW)).toEqual({
      email: account.email,
    });
    const user = await database().models.User.findOne({ where: { email: account.email }, rejectOnEmpty: true });
    expect([user.display_name, await verifyPassword(user.password_hash, PASSWORD)]).toEqual(['Senna', true]);
    await expect(memberContext(other.teamId, account.userId)).resolves.toBeTruthy();
    await expect(memberContext(team.teamId, account.userId)).resolves.toBeTruthy();
  });

  it('makes a person who left a member again, with the role of the new letter', async () => {
    const account = await makeAccount(team.teamId, 'reviewer');
    await endMembership(coordinator, account.userId, NOW);
    await expect(memberContext(team.teamId, account.userId)).rejects.toThrow('not a member');
    const { token } = await invited('technician', account.email);
    await acceptInvitation(answer(token, { name: null, password: PASSWORD }), NOW);
    expect((await memberContext(team.teamId, account.userId)).role).toBe('technician');
  });

  it('stands when the mail server refuses the letter, which is written down and can go out again', async () => {
    mail.refuses = true;
    const { id, letter } = await inviteMember(coordinator, { email: 'a@test.example', role: 'technician' }, NOW);
    expect(letter).toBe('failed');
    const where = { subject_id: toBinary(id) };
    const row = await database().models.Letter.findOne({ where, rejectOnEmpty: true });
    expect([row.sent_at, row.failure]).toEqual([null, 'not-taken']);
    mail.refuses = false;
    expect(await renewInvitation(coordinator, id, NOW)).toEqual({ id, letter: 'sent' });
  });

  it('says that nothing was sent where no mail is set up and no demo is loaded', async () => {
    vi.stubEnv('MAIL_URL', '');
    const { letter } = await inviteMember(coordinator, { email: 'b@test.example', role: 'technician' }, NOW);
    expect(letter).toBe('failed');
  });

  it('is held up after 60 letters an hour', async () => {
    vi.stubEnv('MAIL_URL', '');
    const one = (i: number, at: number) =>
      outcome(inviteMember(coordinator, { email: `p${i}@test.example`, role: 'technician' }, at));
    for (let i = 0; i < 60; i++) expect(await one(i, NOW)).toMatchObject({ letter: 'failed' });
    expect(await one(60, NOW + 1)).toBe('too-many');
    expect(await one(61, NOW + 60 * 60_000)).toMatchObject({ letter: 'failed' });
  });

  it('carries names into the letter as text, whatever signs they have', async () => {
    const ctx = { ...coordinator, displayName: 'Ann <b>\r\nBcc: x@evil.example', teamName: 'R&D' } as TeamContext;
    await inviteMember(ctx, { email: 'c@test.example', role: 'technician' }, NOW);
    const letter = unquoted(mail.received.at(-1) ?? '');
    expect(letter.slice(0, letter.indexOf('\r\n\r\n'))).not.toMatch(/^Bcc:/im);
    expect(letter).toContain('Ann &lt;b&gt;');
    expect(letter).toContain('R&amp;D');
    expect(letter).toContain('text/plain');
    expect(letter).toContain('text/html');
  });
});

describe('a new password by letter', () => {
  async function asked(email: string, at = NOW): Promise<void> {
    await requestReset({ email, address: 'direct' }, at);
    await backgroundDone();
  }

  it('ends every sign-in of the account, in every team, and tells its owner', async () => {
    const account = await makeAccount(team.teamId);
    const second = await makeTeam({ name: 'Ossle' });
    const place = { team_id: toBinary(second.teamId), user_id: toBinary(account.userId) };
    await database().models.Membership.create({ ...place, role: 'reviewer' });
    const { signIn } = await import('@/tests/support/factories/make-team');
    await signIn(team.teamId, account.userId);
    await signIn(second.teamId, account.userId);
    await asked(account.email);
    await resetPassword({ token: tokenIn(mail, 'reset'), password: NEW_PASSWORD }, NOW + 1);
    const user = await database().models.User.findOne({ where: { email: account.email }, rejectOnEmpty: true });
    expect(await verifyPassword(user.password_hash, NEW_PASSWORD)).toBe(true);
    const where = { user_id: toBinary(account.userId), revoked_at: null };
    expect(await database().models.Session.count({ where })).toBe(0);
    expect(mail.received.at(-1)).toMatch(/Subject: Your password for Undereave was changed/);
    expect(await auditOf(team.teamId)).toContain('password.reset');
    expect(await auditOf(second.teamId)).toContain('password.reset');
  });

  it('lets one of 50 through that come at once', async () => {
    const account = await makeAccount(team.teamId);
    await asked(account.email);
    const token = tokenIn(mail, 'reset');
    const outcomes = await Promise.all(
      Array.from({ length: 50 }, (_, i) =>
        outcome(resetPassword({ token, password: `${NEW_PASSWORD} ${i}` }, NOW + i)),
      ),
    );
    const through = outcomes.flatMap((one, i) => (typeof one === 'object' ? [i] : []));
    expect(through).toHaveLength(1);
    expect(outcomes.filter((one) => one === 'link-closed')).toHaveLength(49);
    const user = await database().models.User.findOne({ where: { email: account.email }, rejectOnEmpty: true });
    expect(await verifyPassword(user.password_hash, `${NEW_PASSWORD} ${through[0]}`)).toBe(true);
  }, 120_000);

  it('works for one hour, and only from the newest letter', async () => {
    const account = await makeAccount(team.teamId);
    await asked(account.email);
    const first = tokenIn(mail, 'reset');
    await asked(account.email, NOW + 1_000);
    const newest = tokenIn(mail, 'reset');
    const set = (token: string, at: number) => outcome(resetPassword({ token, password: NEW_PASSWORD }, at));
    expect(await set(first, NOW + 2_000)).toBe('link-closed');
    expect(await set(newest, NOW + 1_000 + 60 * 60_000)).toBe('link-closed');
    expect(await set(newest, NOW + 60 * 60_000)).toEqual({ email: account.email });
    const tokens = await database().models.ResetToken.findAll({ raw: true });
    expect(JSON.stringify([tokens, log.mock.calls])).not.toContain(newest);
  });

  it('is written to nobody without an account in a team', async () => {
    const former = await makeAccount(team.teamId);
    await endMembership(coordinator, former.userId, NOW);
    const disabled = await makeAccount(team.teamId);
    await database().models.User.update({ disabled_at: new Date(0) }, { where: { id: toBinary(disabled.userId) } });
    for (const email of ['nobody@test.example', former.email, disabled.email]) await asked(email);
    expect(mail.received).toEqual([]);
  });

  it('is asked for five times an hour by one address, known or not', async () => {
    const account = await makeAccount(team.teamId);
    for (const email of [account.email, 'nobody@test.example']) {
      for (let i = 0; i < 5; i++) await asked(email, NOW + i);
      expect(await outcome(requestReset({ email, address: 'direct' }, NOW + 6))).toBe('too-many');
    }
  });
});

describe('the last coordinator', () => {
  it('can neither leave nor become something else', async () => {
    const { userId } = team.members.coordinator;
    expect(await outcome(endMembership(coordinator, userId, NOW))).toBe('last-coordinator');
    const change = { text: userId, role: 'reviewer' as const };
    expect(await outcome(changeRole(coordinator, change, NOW))).toBe('last-coordinator');
  });

  it('stays one when two step down at once', async () => {
    for (let round = 0; round < 5; round++) {
      const pair = await makeTeam({ name: `Pair ${round}` });
      const second = await makeAccount(pair.teamId, 'coordinator');
      const ids = [pair.members.coordinator.userId, second.userId];
      const outcomes = await Promise.all(
        ids.map(async (id) => {
          const ctx = await memberContext(pair.teamId, id);
          return outcome(endMembership(ctx, id, NOW));
        }),
      );
      expect(outcomes.filter((one) => one === 'last-coordinator')).toHaveLength(1);
    }
  });
});
