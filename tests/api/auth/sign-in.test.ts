import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import * as meRoute from '@/app/api/me/route';
import { hashPassword } from '@/lib/server/auth/password';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { publicUrl } from '@/lib/server/env';
import { type Account, PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { Browser } from '@/tests/support/auth/browser';
import { problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

vi.mock('@/lib/server/log/log', () => ({ log: () => undefined, describeError: () => ({}) }));

let team: TestTeam;
let account: Account;

beforeAll(async () => {
  team = await makeTeam();
});

beforeEach(async () => {
  await database().models.LoginAttempt.destroy({ where: {} });
  account = await makeAccount(team.teamId);
});

/** What `GET /api/me` says to a `Cookie` header. */
async function me(cookie: string): Promise<Response> {
  return meRoute.GET(new Request('http://127.0.0.1:3000/api/me', { headers: { cookie } }));
}

describe('signing in', () => {
  it('with the right password opens a session that answers who it is', async () => {
    const browser = new Browser();
    const response = await browser.signIn(account.email, PASSWORD);
    expect(response.status).toBe(200);
    expect(await response.json()).toEqual({ url: `${publicUrl()}/` });
    const answer = await me(browser.jar.header());
    expect(answer.status).toBe(200);
    expect(await answer.json()).toMatchObject({
      user: { id: account.userId, name: 'Senna' },
      team: { id: team.teamId, name: 'Tarrow Trust', zone: 'America/New_York' },
      role: 'technician',
    });
  });

  it('looks the address up without regard to case and outer space (B69)', async () => {
    expect((await new Browser().signIn(`  ${account.email.toUpperCase()} `, PASSWORD)).status).toBe(200);
  });

  it('sets cookies that scripts cannot read and other sites do not send', async () => {
    const lines = (await new Browser().signIn(account.email, PASSWORD)).headers.getSetCookie();
    const session = lines.find((line) => line.startsWith('next-auth.session-token='));
    expect(session).toMatch(/; HttpOnly/i);
    expect(session).toMatch(/; SameSite=Lax/i);
    expect(session).toMatch(/; Path=\//i);
    expect(session).not.toMatch(/; Domain/i);
  });

  it('over https binds the cookie to the host', async () => {
    vi.stubEnv('NEXTAUTH_URL', 'https://field.example');
    const browser = new Browser();
    const lines = (await browser.signIn(account.email, PASSWORD)).headers.getSetCookie();
    const session = lines.find((line) => line.startsWith('__Host-next-auth.session-token='));
    expect(session).toMatch(/; Secure/i);
    expect((await me(browser.jar.header())).status).toBe(200);
  });

  it('says the same to a wrong password, an unknown, a disabled and a team-less account (B66)', async () => {
    const disabled = await makeAccount(team.teamId);
    await database().models.User.update({ disabled_at: new Date() }, { where: { id: toBinary(disabled.userId) } });
    const lonely = await makeAccount(null);
    const answers = await Promise.all(
      [
        [account.email, 'not the password at all'],
        ['nobody@test.example', PASSWORD],
        [disabled.email, PASSWORD],
        [lonely.email, PASSWORD],
      ].map(async ([email = '', password = '']) => {
        const response = await new Browser().signIn(email, password);
        return [response.status, await response.text(), response.headers.get('content-type')];
      }),
    );
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(answers[0]?.[0]).toBe(401);
  });

  it('takes about as long for an unknown account as for a wrong password (B66)', async () => {
    const times = { known: [] as number[], unknown: [] as number[] };
    for (let round = 0; round < 12; round++) {
      for (const kind of ['known', 'unknown'] as const) {
        await database().models.LoginAttempt.destroy({ where: {} });
        const browser = new Browser();
        const csrfToken = await browser.csrfToken();
        const email = kind === 'known' ? account.email : `nobody${round}@test.example`;
        const start = performance.now();
        await browser.call('POST', 'callback/credentials', {
          form: { csrfToken, email, password: 'wrong password here', json: 'true' },
        });
        times[kind].push(performance.now() - start);
      }
    }
    const fastest = (list: number[]) => Math.min(...list);
    expect(fastest(times.unknown)).toBeGreaterThan(0.5 * fastest(times.known));
    expect(fastest(times.unknown)).toBeLessThan(2 * fastest(times.known));
  });

  it('without the form’s token opens nothing', async () => {
    const browser = new Browser();
    const response = await browser.call('POST', 'callback/credentials', {
      form: { email: account.email, password: PASSWORD, json: 'true' },
    });
    expect(await response.text()).toContain('csrf=true');
    expect((await me(browser.jar.header())).status).toBe(401);
  });

  it.each<[string, () => Record<string, string>, [number, string]]>([
    ['a password of 257 characters', () => ({ password: 'x'.repeat(257) }), [400, 'shape']],
    ['a password of 4,096 characters', () => ({ password: 'x'.repeat(4_096) }), [400, 'shape']],
    ['a password of 1 MB', () => ({ password: 'x'.repeat(1_000_000) }), [413, 'body']],
    ['an e-mail with a line break (B69)', () => ({ email: 'a@b.example\r\nBcc: x' }), [400, 'shape']],
    ['an e-mail of 300 characters', () => ({ email: `${'a'.repeat(300)}@b.example` }), [400, 'shape']],
  ])('refuses %s before any hashing (B67)', async (_what, form, expected) => {
    expect(await problemOf(await new Browser().signIn(account.email, PASSWORD, { form: form() }))).toEqual(expected);
  });

  it('takes a password of 256 characters, emoji and outer spaces as they are (B67)', async () => {
    const password = ` ${'😀'.repeat(254)} `;
    await database().models.User.update(
      { password_hash: await hashPassword(password) },
      { where: { id: toBinary(account.userId) } },
    );
    expect((await new Browser().signIn(account.email, password.trim())).status).toBe(401);
    expect((await new Browser().signIn(account.email, password.slice(0, -1))).status).toBe(401);
    expect((await new Browser().signIn(account.email, password)).status).toBe(200);
  });
});

describe('guessing (B80)', () => {
  const guess = async (email: string) => new Browser().signIn(email, 'wrong password here');

  it('meets a wait after five wrong passwords, which grows and is told', async () => {
    for (let i = 0; i < 5; i++) expect((await guess(account.email)).status).toBe(401);
    const refused = await guess(account.email);
    expect(await problemOf(refused.clone())).toEqual([429, 'too-many']);
    expect(refused.headers.get('retry-after')).toBe('1');
    expect(((await refused.json()) as { url: string }).url).toContain('/sign-in?error=too-many');
    for (const [failures, wait] of [
      [6, 2],
      [9, 16],
      [12, 60],
      [30, 60],
    ] as const) {
      await database().models.LoginAttempt.destroy({ where: {} });
      await failed(account.email, failures);
      expect((await guess(account.email)).headers.get('retry-after')).toBe(String(wait));
    }
  });

  it('also keeps the owner waiting, but never shuts the account for good', async () => {
    await failed(account.email, 30);
    expect((await new Browser().signIn(account.email, PASSWORD)).status).toBe(429);
    await database().models.LoginAttempt.update({ at: new Date(Date.now() - 61_000) }, { where: {} });
    expect((await new Browser().signIn(account.email, PASSWORD)).status).toBe(200);
    expect((await guess(account.email)).status).toBe(401);
  });

  it('waits alike for an account that does not exist', async () => {
    for (let i = 0; i < 5; i++) await guess('nobody@test.example');
    expect((await guess('nobody@test.example')).status).toBe(429);
  });

  it('does not keep other accounts waiting', async () => {
    await failed(account.email, 30);
    const other = await makeAccount(team.teamId);
    expect((await new Browser().signIn(other.email, PASSWORD)).status).toBe(200);
  });

  it('over many accounts from one address ends at 300 a minute, whatever the address claims to be (B74)', async () => {
    const { createHash } = await import('node:crypto');
    const { v7 } = await import('uuid');
    const subject = createHash('sha256').update('address:direct').digest();
    const at = new Date();
    await database().models.LoginAttempt.bulkCreate(
      Array.from({ length: 300 }, () => ({ id: toBinary(v7()), subject, failed: true, at })),
    );
    const response = await new Browser().signIn(account.email, PASSWORD, {
      headers: { 'x-forwarded-for': '203.0.113.7' },
    });
    expect(await problemOf(response)).toEqual([429, 'too-many']);
  });

  /** Writes wrong passwords down as if they had just been tried. */
  async function failed(email: string, count: number): Promise<void> {
    const { createHash } = await import('node:crypto');
    const { v7 } = await import('uuid');
    const subject = createHash('sha256').update(`account:${email}`).digest();
    const at = new Date();
    await database().models.LoginAttempt.bulkCreate(
      Array.from({ length: count }, () => ({ id: toBinary(v7()), subject, failed: true, at })),
    );
  }
});
