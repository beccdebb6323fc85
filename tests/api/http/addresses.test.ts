import { beforeAll, describe, expect, it } from 'vitest';
import * as unknownRoute from '@/app/api/[...path]/route';
import * as healthRoute from '@/app/api/health/route';
import * as meRoute from '@/app/api/me/route';
import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import * as haveRoute from '@/app/api/sync/v1/have/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import * as pushRoute from '@/app/api/sync/v1/push/route';
import { isUuidText } from '@/lib/kit/uuid';
import type { MeResponse } from '@/lib/protocol/me';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'] as const;

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

describe.each([
  ['enrol', enrolRoute, ['POST']],
  ['push', pushRoute, ['POST']],
  ['have', haveRoute, ['POST']],
  ['pull', pullRoute, ['GET']],
  ['me', meRoute, ['GET']],
  ['health', healthRoute, ['GET']],
] as const)('%s', (_name, route, allowed) => {
  it.each(METHODS.filter((method) => !(allowed as readonly string[]).includes(method)))(
    'answers %s with 405 and what it takes (B75)',
    async (method) => {
      const response = await callApi(route, method, { as: team.members.technician });
      expect(response.headers.get('allow')?.split(', ')).toEqual(expect.arrayContaining([...allowed]));
      expect(response.headers.get('access-control-allow-origin')).toBeNull();
      expect(await problemOf(response)).toEqual([405, 'method']);
    },
  );
});

describe('an address that does not exist', () => {
  it.each([...METHODS, 'HEAD'] as const)('answers %s with a problem', async (method) => {
    const response = await unknownRoute[method]();
    expect(response.status).toBe(404);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toMatchObject({
      type: 'urn:undereave:problem:not-found',
      code: 'not-found',
      status: 404,
    });
  });
});

describe('every answer', () => {
  it('names its request and is neither stored nor sniffed', async () => {
    const problem = await callApi(meRoute, 'GET');
    const { requestId } = (await problem.clone().json()) as { requestId: string };
    expect(isUuidText(requestId)).toBe(true);
    for (const response of [
      problem,
      await callApi(meRoute, 'GET', { as: team.members.researcher }),
      await callApi(healthRoute, 'GET'),
    ]) {
      expect(response.headers.get('cache-control')).toBe('no-store');
      expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    }
  });

  it('to HEAD is that to GET without its body', async () => {
    const response = await callApi(meRoute, 'HEAD', { as: team.members.technician });
    expect([response.status, await response.text()]).toEqual([200, '']);
    expect((await callApi(meRoute, 'HEAD')).status).toBe(401);
  });
});

describe('GET /api/me', () => {
  it('names the person, the team and everyone in it, for every role', async () => {
    for (const member of Object.values(team.members)) {
      const answer = (await (await callApi(meRoute, 'GET', { as: member })).json()) as MeResponse;
      expect(answer).toMatchObject({
        user: { id: member.userId, name: member.name },
        role: member.role,
        team: { id: team.teamId },
      });
      expect(new Set(answer.members.map(({ id }) => id))).toEqual(
        new Set(Object.values(team.members).map(({ userId }) => userId)),
      );
    }
  });

  it('names nobody of another team, and asks for no parameters', async () => {
    const other = await makeTeam({ name: 'Ossle', canary: ' canary' });
    const answer = await (await callApi(meRoute, 'GET', { as: team.members.technician })).text();
    expect(answer).not.toContain('canary');
    expect(answer).not.toContain(other.teamId);
    expect(await problemOf(await callApi(meRoute, 'GET', { as: team.members.technician, query: 'team=1' }))).toEqual([
      400,
      'param',
    ]);
  });
});
