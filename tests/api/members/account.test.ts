import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import * as acceptRoute from '@/app/api/invitation/accept/route';
import * as leaveRoute from '@/app/api/account/leave/route';
import * as passwordRoute from '@/app/api/account/password/route';
import * as endRoute from '@/app/api/account/sessions/[id]/end/route';
import * as endOthersRoute from '@/app/api/account/sessions/end-others/route';
import * as teamRoute from '@/app/api/account/team/route';
import * as forgottenRoute from '@/app/api/password/forgotten/route';
import * as resetRoute from '@/app/api/password/reset/route';
import * as meRoute from '@/app/api/me/route';
import { backgroundDone } from '@/lib/server/commands/account/background';
import { memberContext } from '@/lib/server/auth/member-context';
import { homeTeam } from '@/lib/server/auth/session-rows';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { ownAccount } from '@/lib/server/queries/own-account';
import { type Account, PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { Browser } from '@/tests/support/auth/browser';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

vi.mock('@/lib/server/log/log', () => ({ log: () => undefined, describeError: () => ({}) }));

const NEW_PASSWORD = 'eleven kestrels over gravel';
const FIREFOX = { 'user-agent': 'Mozilla/5.0 (Windows NT 10.0; rv:145.0) Gecko/20100101 Firefox/145.0' };

let team: TestTeam;
let account: Account;

beforeAll(async () => {
  team = await makeTeam();
});

beforeEach(async () => {
  await database().models.LoginAttempt.destroy({ where: {} });
  account = await makeAccount(team.teamId);
});

async function signedIn(): Promise<Browser> {
  const browser = new Browser();
  await browser.signIn(account.email, PASSWORD, { headers: FIREFOX });
  return browser;
}

const cookieOf = (browser: Browser) => ({ cookie: browser.jar.header() });
const meStatus = async (browser: Browser) => (await callApi(meRoute, 'GET', { headers: cookieOf(browser) })).status;

describe('one’s own password', () => {
  const change = (browser: Browser, current: string, password: string) =>
    callApi(passwordRoute, 'POST', { headers: cookieOf(browser), body: { current, password } });

  it('is changed with the present one; the sign-in it happens in goes on, others end', async () => {
    const [here, elsewhere] = [await signedIn(), await signedIn()];
    expect((await change(here, PASSWORD, NEW_PASSWORD)).status).toBe(200);
    expect([await meStatus(here), await meStatus(elsewhere)]).toEqual([200, 401]);
    expect((await new Browser().signIn(account.email, PASSWORD)).status).toBe(401);
    expect((await new Browser().signIn(account.email, NEW_PASSWORD)).status).toBe(200);
  });

  it('is not changed with a wrong one, and guessing it meets the wait of the sign-in', async () => {
    const browser = await signedIn();
    for (let i = 0; i < 5; i++) {
      expect(await problemOf(await change(browser, 'not the password', NEW_PASSWORD))).toEqual([403, 'wrong-password']);
    }
    const refused = await change(browser, PASSWORD, NEW_PASSWORD);
    expect(refused.headers.get('retry-after')).toBe('1');
    expect(await problemOf(refused)).toEqual([429, 'too-many']);
  });

  it.each([
    ['of 14 signs', 'kestrelgravels', [400, 'password-length']],
    ['of 257 signs', 'x'.repeat(257), [400, 'password-length']],
    ['of 4,096 signs', 'x'.repeat(4_096), [400, 'password-length']],
    ['of common words (B68)', 'passwordpassword', [400, 'common']],
    ['that names the product (B68)', 'kestrels Undereave gravel', [400, 'common']],
    ['that names the team (B68)', 'kestrels tarrow trust gravel', [400, 'common']],
  ])('does not become one %s', async (_what, password, expected) => {
    expect(await problemOf(await change(await signedIn(), PASSWORD, password))).toEqual(expected);
  });

  it('of 1 MB is refused before any of it is looked at (B67)', async () => {
    expect(await problemOf(await change(await signedIn(), PASSWORD, 'x'.repeat(1_000_000)))).toEqual([413, 'body']);
  });
});

describe('one’s own sign-ins', () => {
  const listOf = async () => {
    const ctx = await memberContext(team.teamId, account.userId);
    return (await ownAccount(ctx, Date.now())).sessions;
  };

  it('are listed by browser, with no address and no version', async () => {
    await signedIn();
    const [session] = await listOf();
    expect(session?.agent).toBe('Firefox on Windows');
    const rows = await database().models.Session.findAll({ where: { user_id: toBinary(account.userId) }, raw: true });
    expect(JSON.stringify(rows)).not.toMatch(/145\.0|127\.0\.0\.1|direct/);
  });

  it('are ended one by one; a second time there is nothing to end', async () => {
    const [here, elsewhere] = [await signedIn(), await signedIn()];
    const ctx = JSON.stringify(await listOf());
    expect(ctx).toContain('Firefox');
    const sessions = await database().models.Session.findAll({
      where: { user_id: toBinary(account.userId) },
      order: [['id', 'DESC']],
    });
    const { fromBinary } = await import('@/lib/server/db/uuid-binary');
    const latest = sessions[0] ? fromBinary(sessions[0].id) : '';
    const end = () => callApi(endRoute, 'POST', { headers: cookieOf(here), params: { id: latest }, body: {} });
    expect((await end()).status).toBe(200);
    expect([await meStatus(here), await meStatus(elsewhere)]).toEqual([200, 401]);
    expect(await problemOf(await end())).toEqual([404, 'not-found']);
  });

  it('are ended all but the one that asks', async () => {
    const [here, a, b] = [await signedIn(), await signedIn(), await signedIn()];
    const response = await callApi(endOthersRoute, 'POST', { headers: cookieOf(here), body: {} });
    expect(await response.json()).toEqual({ ended: 2 });
    expect([await meStatus(here), await meStatus(a), await meStatus(b)]).toEqual([200, 401, 401]);
  });
});

describe('a person in two teams', () => {
  it('steps from one into the other with a new session, and comes back to where they were last', async () => {
    const second = await makeTeam({ name: 'Zeal Group' });
    const place = { team_id: toBinary(second.teamId), user_id: toBinary(account.userId) };
    await database().models.Membership.create({ ...place, role: 'reviewer' });
    const browser = await signedIn();
    const before = cookieOf(browser);
    const response = await callApi(teamRoute, 'POST', { headers: before, body: { team: second.teamId } });
    expect(await response.clone().json()).toEqual({ team: { id: second.teamId, name: 'Zeal Group' } });
    browser.jar.take(response);
    const me = (await (await callApi(meRoute, 'GET', { headers: cookieOf(browser) })).json()) as { role: string };
    expect(me).toMatchObject({ role: 'reviewer', team: { id: second.teamId } });
    expect((await callApi(meRoute, 'GET', { headers: before })).status).toBe(401);
    await database().models.Session.update(
      { last_seen_at: new Date(0) },
      { where: { team_id: toBinary(team.teamId), user_id: toBinary(account.userId) } },
    );
    expect(await homeTeam(account.userId)).toBe(second.teamId);
  });

  it('who leaves one stays in the other, and is signed out of the one at once', async () => {
    const second = await makeTeam({ name: 'Zeal Group' });
    const place = { team_id: toBinary(second.teamId), user_id: toBinary(account.userId) };
    await database().models.Membership.create({ ...place, role: 'reviewer' });
    const browser = await signedIn();
    expect((await callApi(leaveRoute, 'POST', { headers: cookieOf(browser), body: {} })).status).toBe(200);
    expect(await meStatus(browser)).toBe(401);
    expect((await new Browser().signIn(account.email, PASSWORD)).status).toBe(200);
    expect(await homeTeam(account.userId)).not.toBe(team.teamId);
  });
});

describe('a forgotten password', () => {
  const ask = (email: string) => callApi(forgottenRoute, 'POST', { body: { email } });

  it('tells nobody who has an account: the same answer, byte for byte', async () => {
    const answers = [];
    for (const email of [account.email, 'nobody@test.example', account.email.toUpperCase()]) {
      const response = await ask(email);
      answers.push([response.status, await response.text(), JSON.stringify([...response.headers])]);
    }
    await backgroundDone();
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(answers[0]?.slice(0, 2)).toEqual([200, '{}']);
  });

  it('takes about as long with an account as without', async () => {
    const times = { known: [] as number[], unknown: [] as number[] };
    for (let round = 0; round < 30; round++) {
      for (const kind of ['known', 'unknown'] as const) {
        const email = kind === 'known' ? account.email : `nobody${round}@test.example`;
        await database().models.LoginAttempt.destroy({ where: {} });
        const start = performance.now();
        await ask(email);
        times[kind].push(performance.now() - start);
        await backgroundDone();
      }
    }
    const middle = (list: number[]) => [...list].sort((a, b) => a - b)[15] ?? 0;
    expect(middle(times.known)).toBeLessThan(2 * middle(times.unknown));
    expect(middle(times.known)).toBeGreaterThan(0.5 * middle(times.unknown));
  });

  it.each(['no address', 'a@b', 'a@b.example\r\nBcc: x@y.example', `${'a'.repeat(250)}@b.example`, '<a@b.example>'])(
    'is not asked for with %j (B69)',
    async (email) => {
      expect(await problemOf(await ask(email))).toEqual([400, 'shape']);
    },
  );
});

describe('routes for people without a sign-in', () => {
  const ROUTES = [
    ['forgotten', forgottenRoute],
    ['reset', resetRoute],
    ['accept', acceptRoute],
  ] as const;

  it.each(ROUTES)('%s takes nothing another site sends, nor a form (B71)', async (_name, handlers) => {
    for (const [name, value] of [
      ['origin', 'https://evil.example'],
      ['sec-fetch-site', 'cross-site'],
      ['x-sync', '0'],
    ] as const) {
      const headers = { [name]: value };
      expect(await problemOf(await callApi(handlers, 'POST', { headers, body: {} }))).toEqual([403, 'csrf']);
    }
    const form = { headers: { 'content-type': 'application/x-www-form-urlencoded' }, body: 'email=a' };
    expect(await problemOf(await callApi(handlers, 'POST', form))).toEqual([415, 'content-type']);
  });

  it.each(ROUTES)('%s knows no further members and no query', async (_name, handlers) => {
    const body = { email: 'a@b.example', token: 'x', password: 'x', name: 'x', role: 'coordinator' };
    expect(await problemOf(await callApi(handlers, 'POST', { body }))).toEqual([400, 'unknown-field']);
    expect(await problemOf(await callApi(handlers, 'POST', { query: 'token=x', body }))).toEqual([400, 'param']);
  });

  it('are counted together by address, and end at 300 a minute', async () => {
    const { createHash } = await import('node:crypto');
    const { v7 } = await import('uuid');
    const subject = createHash('sha256').update('allowance:public:direct').digest();
    const at = new Date();
    await database().models.LoginAttempt.bulkCreate(
      Array.from({ length: 300 }, () => ({ id: toBinary(v7()), subject, failed: false, at })),
    );
    const body = { token: 'x', password: 'x' };
    expect(await problemOf(await callApi(resetRoute, 'POST', { body }))).toEqual([429, 'too-many']);
  });
});
