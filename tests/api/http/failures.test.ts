import { ConnectionAcquireTimeoutError, ConnectionRefusedError, DatabaseError } from 'sequelize';
import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import * as healthRoute from '@/app/api/health/route';
import * as meRoute from '@/app/api/me/route';
import { database } from '@/lib/server/db/database';
import { describeError, log } from '@/lib/server/log/log';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;
const lines: string[] = [];

beforeAll(async () => {
  team = await makeTeam();
});

beforeEach(() => {
  lines.length = 0;
  vi.spyOn(process.stderr, 'write').mockImplementation((text) => lines.push(String(text)) > 0);
});

/** Lets every statement fail. */
function breakDatabase(error: Error): void {
  vi.spyOn(database().sequelize, 'query').mockRejectedValue(error);
}

const parent = (errno: number, sql: string) =>
  Object.assign(new Error('Duplicate entry "secret words"'), { errno, sql });
const me = () => callApi(meRoute, 'GET', { as: team.members.technician });

describe('a failure on our side', () => {
  it.each([
    ['the database refuses connections', new ConnectionRefusedError(new Error('ECONNREFUSED'))],
    ['no connection is free', new ConnectionAcquireTimeoutError(new Error('acquire'))],
    ['there are too many connections', new DatabaseError(parent(1040, 'SELECT 1'))],
    ['deadlocks do not end', new DatabaseError(parent(1213, 'SELECT 1'))],
    ['the disk is full', new DatabaseError(parent(1021, 'SELECT 1'))],
  ])('%s: 503, and when to come back (F38–F43)', async (_what, error) => {
    breakDatabase(error);
    const response = await me();
    expect(await problemOf(response)).toEqual([503, 'busy']);
    expect(Number(response.headers.get('retry-after'))).toBeGreaterThan(0);
  });

  it('of any other kind is 500, shown as nothing, logged under the id of the request', async () => {
    breakDatabase(new DatabaseError(parent(1406, 'INSERT INTO nests VALUES ("secret words")')));
    const response = await me();
    const problem = (await response.json()) as { requestId: string };
    expect(problem).toEqual({
      type: 'urn:undereave:problem:internal',
      title: 'Something failed on our side. Nothing was stored.',
      status: 500,
      code: 'internal',
      requestId: expect.any(String) as string,
    });
    expect(lines).toHaveLength(1);
    expect(JSON.parse(lines[0] ?? '')).toMatchObject({ event: 'internal', requestId: problem.requestId, errno: 1406 });
    expect(lines.join('')).not.toContain('secret');
  });

  it('turns health red', async () => {
    breakDatabase(new ConnectionRefusedError(new Error('ECONNREFUSED')));
    const response = await callApi(healthRoute, 'GET');
    expect(response.status).toBe(503);
    expect(await response.json()).toEqual({ ok: false, db: false, photos: true, epoch: null });
  });

  it('also when the database only hangs (F39)', async () => {
    vi.spyOn(database().sequelize, 'query').mockImplementation((() => new Promise(() => undefined)) as never);
    const start = performance.now();
    expect((await callApi(healthRoute, 'GET')).status).toBe(503);
    expect(performance.now() - start).toBeLessThan(6_000);
  });
});

describe('the log', () => {
  it('is one JSON object a line, whatever is written into it', () => {
    log({ event: 'odd\r\n{"event":"forged"}' });
    expect(lines).toHaveLength(1);
    expect(lines[0]?.trimEnd().split('\n')).toHaveLength(1);
    expect(JSON.parse(lines[0] ?? '')).toMatchObject({ event: 'odd\r\n{"event":"forged"}' });
  });

  it('describes what is no error by its type alone', () => {
    expect(describeError('secret words')).toEqual({ error: 'string' });
    expect(describeError(new TypeError('x is undefined'))).toMatchObject({
      error: 'TypeError',
      message: 'x is undefined',
    });
  });
});
