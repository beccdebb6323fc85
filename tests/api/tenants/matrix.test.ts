import { readdirSync } from 'node:fs';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { ROLES, type Role } from '@/lib/server/auth/role';
import { sessionSetCookie } from '@/lib/server/auth/session-cookie';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { MethodHandlers } from '@/lib/server/http/methods';
import { type ApiCall, callApi } from '@/tests/support/factories/call-api';
import { type TestMember, signIn } from '@/tests/support/factories/make-team';
import type { Asker, Method, MethodExpectation, RouteExpectation } from './expectation';
import { EXPECTATIONS } from './expectations';
import { teamDigest } from './team-digest';
import { type Tenant, makeTwoTeams } from './two-teams';

const METHODS: readonly Method[] = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];
const ROUTE_FILES = readdirSync('app/api', { recursive: true, encoding: 'utf8' }).filter((file) =>
  file.endsWith('route.ts'),
);
const ROUTES = Object.entries(EXPECTATIONS);

let teams: { a: Tenant; b: Tenant };

beforeAll(async () => {
  teams = await makeTwoTeams();
}, 60_000);

/** Everything an answer gives away: status, headers, bytes. */
async function bytesOf(response: Response): Promise<string> {
  const headers = [...response.headers].map(([name, value]) => `${name}: ${value}`).join('\n');
  return `${response.status}\n${headers}\n\n${await response.text()}`;
}

/** Sends a request and makes sure that nothing of the other team is in the answer. */
async function ask(
  expectation: RouteExpectation,
  method: Method,
  { call, asker }: { call: ApiCall; asker: Asker },
): Promise<string> {
  const handlers = await expectation.load();
  const answer = await bytesOf(await callApi(handlers as MethodHandlers, method, { as: asker.member, ...call }));
  for (const secret of asker.other.secrets) {
    // An id that was asked for may be named again, as a push result does.
    if (!JSON.stringify(call).includes(secret)) expect(answer).not.toContain(secret);
  }
  return answer;
}

const statusOf = (answer: string) => Number(answer.slice(0, 3));

/** An answer without what differs from request to request. */
function comparable(answer: string, call: ApiCall): string {
  const asked = [...JSON.stringify(call).matchAll(/[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}|[0-9a-f]{64}/g)].map(
    ([id]) => id,
  );
  const bare = asked.reduce((text, id) => text.replaceAll(id, 'asked'), answer);
  return bare.replace(/"(requestId|serverTime)":"[^"]*"/g, '"$1":""');
}

function askers(role: Role): Asker[] {
  const { a, b } = teams;
  return [
    { member: a.team.members[role], tenant: a, other: b },
    { member: b.team.members[role], tenant: b, other: a },
  ];
}

it('has an expectation for every route file, and none for a file that is gone', () => {
  expect(ROUTE_FILES.length).toBeGreaterThan(10);
  expect(Object.keys(EXPECTATIONS).sort()).toEqual([...ROUTE_FILES].sort());
});

it('would notice a canary: each team sees its own', async () => {
  for (const asker of askers('coordinator')) {
    const handlers = await EXPECTATIONS['nests/route.ts']?.load();
    const response = await callApi(handlers as MethodHandlers, 'GET', { as: asker.member });
    expect(await response.text()).toContain(asker.tenant.canary);
  }
});

describe.each(ROUTES)('%s', (_, expectation) => {
  const rows = Object.entries(expectation.methods) as [Method, MethodExpectation][];
  const cases = rows.flatMap(([method, row]) => ROLES.map((role) => ({ method, row, role })));

  it.each(cases)('$method as $role: own things, and nothing of the other team', async ({ method, row, role }) => {
    const isAllowed = row.may === 'public' || row.may.includes(role);
    for (const asker of askers(role)) {
      const isWatched = method !== 'GET' || role === 'reviewer';
      const digest = () => (isWatched ? teamDigest(asker.other.team.teamId) : null);
      const untouched = await digest();
      for (const { name, call, status } of await row.own(asker)) {
        const answer = await ask(expectation, method, { call, asker });
        expect([name, statusOf(answer)]).toEqual([name, isAllowed ? status : 403]);
      }
      for (const { name, foreign, unknown, status } of row.pairs?.(asker) ?? []) {
        const theirs = await ask(expectation, method, { call: foreign, asker });
        const nobodys = await ask(expectation, method, { call: unknown, asker });
        expect([name, statusOf(theirs)]).toEqual([name, isAllowed ? status : 403]);
        expect(comparable(theirs, foreign)).toBe(comparable(nobodys, unknown));
      }
      expect(await digest()).toBe(untouched);
    }
  });

  it('answers nobody who is not, or no longer, signed in', async () => {
    for (const [method, row] of rows) {
      if (row.may === 'public') continue;
      for (const [asker] of [askers('biologist')]) {
        if (!asker) continue;
        const [first] = await row.own(asker);
        for (const { name, member } of await strangers(asker)) {
          const answer = await ask(expectation, method, { call: { ...first?.call }, asker: { ...asker, member } });
          expect([name, statusOf(answer)]).toEqual([name, 401]);
          expect(answer).toContain('"code":"signin"');
          expect(answer).not.toContain(asker.tenant.canary);
        }
      }
    }
  });

  it('takes no method that it has no expectation for', async () => {
    const [asker] = askers('biologist');
    if (!asker) return;
    for (const method of METHODS) {
      const isHead = method === 'HEAD' && expectation.methods.GET;
      if (expectation.methods[method] || (isHead && !expectation.otherwise)) continue;
      const params = { id: asker.tenant.only.nest, nextauth: ['session'] };
      const answer = await ask(expectation, method, { call: { params }, asker });
      expect([method, statusOf(answer)]).toEqual([method, expectation.otherwise ?? 405]);
    }
  });

  it('refuses what another site sends in a person’s name', async () => {
    const [asker] = askers('biologist');
    if (!asker) return;
    for (const [method, row] of rows) {
      if (row.may === 'public') continue;
      const [first] = await row.own(asker);
      for (const [name, value] of [
        ['origin', 'https://evil.example'],
        ['sec-fetch-site', 'cross-site'],
      ] as const) {
        const call = { ...first?.call, headers: { ...first?.call.headers, [name]: value } };
        const answer = await ask(expectation, method, { call, asker });
        expect([statusOf(answer), answer.includes('"code":"csrf"')]).toEqual([403, true]);
      }
    }
  });
});

/** People whose session does not count: none, forged, ended, run out, of a disabled account, of a former member. */
async function strangers({ member, tenant }: Asker): Promise<{ name: string; member: TestMember }[]> {
  const { teamId } = tenant.team;
  const { Session, User } = database().models;
  const session = async (change: object) => {
    const cookie = await signIn(teamId, member.userId);
    const latest = await Session.findOne({
      where: { team_id: toBinary(teamId) },
      order: [['id', 'DESC']],
      rejectOnEmpty: true,
    });
    await latest.update(change);
    return { ...member, cookie };
  };
  const disabled = async () => {
    const userId = v7();
    const bare = {
      email: `${userId}@test.example`,
      display_name: 'Gone',
      password_hash: 'x',
      disabled_at: new Date(0),
    };
    await User.create({ id: toBinary(userId), ...bare });
    await database().models.Membership.create({
      team_id: toBinary(teamId),
      user_id: toBinary(userId),
      role: 'biologist',
    });
    return { ...member, cookie: await signIn(teamId, userId) };
  };
  const unknown = await sessionSetCookie({ userId: member.userId, teamId, sessionId: v7() });
  return [
    { name: 'no cookie', member: { ...member, cookie: '' } },
    { name: 'forged cookie', member: { ...member, cookie: `${member.cookie.slice(0, -4)}AAAA` } },
    { name: 'no such session', member: { ...member, cookie: unknown.split(';', 1)[0] ?? '' } },
    { name: 'ended', member: await session({ revoked_at: new Date(0) }) },
    { name: 'run out', member: await session({ expires_at: new Date(0) }) },
    { name: 'disabled', member: await disabled() },
  ];
}
