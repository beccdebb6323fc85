import { createHmac } from 'node:crypto';
import { encode } from 'next-auth/jwt';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import * as meRoute from '@/app/api/me/route';
import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import { formatSid } from '@/lib/server/auth/session-id';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { authSecret } from '@/lib/server/env';
import { type Account, PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { Browser } from '@/tests/support/auth/browser';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

vi.mock('@/lib/server/log/log', () => ({ log: () => undefined, describeError: () => ({}) }));

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

async function me(cookie: string): Promise<Response> {
  return meRoute.GET(new Request('http://127.0.0.1:3000/api/me', { headers: { cookie } }));
}

async function signedIn(): Promise<{ account: Account; browser: Browser; cookie: string }> {
  const account = await makeAccount(team.teamId);
  const browser = new Browser();
  await browser.signIn(account.email, PASSWORD);
  return { account, browser, cookie: browser.jar.header() };
}

async function sessionOf({ userId }: Account) {
  return database().models.Session.findOne({ where: { user_id: toBinary(userId) }, rejectOnEmpty: true });
}

describe('a session', () => {
  it('ends at sign-out: the cookie of before, played again, is refused', async () => {
    const { browser, cookie } = await signedIn();
    expect((await me(cookie)).status).toBe(200);
    expect((await browser.signOut()).status).toBe(200);
    expect((await me(browser.jar.header())).status).toBe(401);
    expect(await problemOf(await me(cookie))).toEqual([401, 'signin']);
  });

  it('ends alone: another sign-in of the same person goes on', async () => {
    const { account, browser } = await signedIn();
    const second = new Browser();
    await second.signIn(account.email, PASSWORD);
    await browser.signOut();
    expect((await me(second.jar.header())).status).toBe(200);
  });

  it('is refused with the next request after the office ended it, or it ran out', async () => {
    const [revoked, expired] = [await signedIn(), await signedIn()];
    await (await sessionOf(revoked.account)).update({ revoked_at: new Date() });
    await (await sessionOf(expired.account)).update({ expires_at: new Date(Date.now() - 1) });
    expect((await me(revoked.cookie)).status).toBe(401);
    expect((await me(expired.cookie)).status).toBe(401);
  });

  it('is refused with the next request after the account was disabled or left the team (F58)', async () => {
    const [disabled, left] = [await signedIn(), await signedIn()];
    await database().models.User.update(
      { disabled_at: new Date() },
      { where: { id: toBinary(disabled.account.userId) } },
    );
    await (await sessionOf(left.account)).destroy();
    expect((await me(disabled.cookie)).status).toBe(401);
    expect((await me(left.cookie)).status).toBe(401);
  });

  it('has the role the person has now, not the one of the sign-in', async () => {
    const { account, cookie } = await signedIn();
    const enrol = () => callApi(enrolRoute, 'POST', { headers: { cookie }, body: { label: 'x' } });
    expect((await enrol()).status).toBe(200);
    await database().models.Membership.update({ role: 'researcher' }, { where: { user_id: toBinary(account.userId) } });
    expect(await problemOf(await enrol())).toEqual([403, 'role']);
  });

  it('with several memberships is in the first team by name', async () => {
    const account = await makeAccount(team.teamId);
    const earlier = await makeTeam({ name: 'Ander' });
    await database().models.Membership.create({
      team_id: toBinary(earlier.teamId),
      user_id: toBinary(account.userId),
      role: 'reviewer',
    });
    const browser = new Browser();
    await browser.signIn(account.email, PASSWORD);
    expect(await (await me(browser.jar.header())).json()).toMatchObject({ team: { name: 'Ander' }, role: 'reviewer' });
  });

  it('in use is extended, and its cookie renewed once a day', async () => {
    const { account, cookie } = await signedIn();
    expect((await me(cookie)).headers.getSetCookie()).toEqual([]);
    const row = await sessionOf(account);
    const dayAgo = Date.now() - 25 * 3_600_000;
    await row.update({ last_seen_at: new Date(dayAgo), expires_at: new Date(dayAgo + 30 * 86_400_000) });
    const sid = formatSid({ teamId: team.teamId, sessionId: fromBinary(row.id) });
    vi.useFakeTimers({ now: dayAgo, toFake: ['Date'] });
    const old = await encode({ token: { sub: account.userId, sid }, secret: authSecret() });
    vi.useRealTimers();
    const [line = ''] = (await me(`next-auth.session-token=${old}`)).headers.getSetCookie();
    expect(line).toMatch(/^next-auth\.session-token=.*Max-Age=2592000; HttpOnly; SameSite=Lax$/);
    expect((await me(line.split(';')[0] ?? '')).status).toBe(200);
    await row.reload();
    expect(row.expires_at.getTime()).toBeGreaterThan(Date.now() + 29.9 * 86_400_000);
  });

  it('is shown by next-auth as name and end, nothing else; an ended one as nothing', async () => {
    const { browser, cookie } = await signedIn();
    expect(await (await browser.call('GET', 'session')).json()).toEqual({
      expires: expect.any(String) as string,
      user: { name: 'Senna' },
    });
    await browser.signOut();
    const replay = await new Browser().call('GET', 'session', { headers: { cookie } });
    expect(await replay.json()).toEqual({});
  });
});

describe('a forged session token (B72)', () => {
  const claims = async () => {
    const { account } = await signedIn();
    const row = await sessionOf(account);
    return { sub: account.userId, sid: formatSid({ teamId: team.teamId, sessionId: fromBinary(row.id) }) };
  };
  const refused = async (token: string) => expect((await me(`next-auth.session-token=${token}`)).status).toBe(401);

  it('with the right key but no session is refused', async () => {
    const { sub } = await claims();
    const secret = authSecret();
    await refused(await encode({ token: { sub, sid: formatSid({ teamId: team.teamId, sessionId: v7() }) }, secret }));
    await refused(await encode({ token: { sub }, secret }));
    await refused(await encode({ token: { sub, sid: 'x.y' }, secret }));
  });

  it('with another key, signed instead of encrypted, without algorithm, or expired is refused', async () => {
    const token = await claims();
    await refused(await encode({ token, secret: 'another secret altogether' }));
    await refused(await encode({ token, secret: authSecret(), maxAge: -60 }));
    const signed = (alg: string) =>
      [{ alg }, token].map((part) => Buffer.from(JSON.stringify(part)).toString('base64url')).join('.');
    await refused(`${signed('none')}.`);
    await refused(
      `${signed('HS256')}.${createHmac('sha256', authSecret()).update(signed('HS256')).digest('base64url')}`,
    );
    await refused('');
    await refused('%%%');
  });

  it('of one team with the session of another is refused', async () => {
    const { sid } = await claims();
    const other = await makeTeam({ name: 'Ossle' });
    const sessionId = sid.split('.')[1] ?? '';
    await refused(
      await encode({ token: { sub: v7(), sid: formatSid({ teamId: other.teamId, sessionId }) }, secret: authSecret() }),
    );
  });
});
