import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import * as haveRoute from '@/app/api/sync/v1/have/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import type { Op } from '@/lib/protocol/op';
import type { PullRow } from '@/lib/protocol/pull';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { type Phone, enrol, pull, push } from '@/tests/support/push/phone';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;
let phone: Phone;
let ops: Op[];

beforeAll(async () => {
  team = await makeTeam();
  phone = await enrol(team.members.technician);
  const ids = freshIds();
  ops = [...openingOps(ids, 'N1'), ...[0, 1, 2, 3].map((q) => markOp(ids, { q, r: 0, state: 'egg' }))];
  await push(phone, ops);
});

const get = (query: string, as = phone.member) =>
  callApi(pullRoute, 'GET', { as, query, headers: as === phone.member ? phone.headers : {} });

describe('a pull', () => {
  it('gives every operation as it came, in the order of the log, with what the office knows', async () => {
    const answer = await pull(phone);
    expect(answer).toMatchObject({ protocol: 1, epoch: 1, safeSeq: 0, next: '1:7', more: false });
    const known = answer.rows.map(({ seq, actor, receivedAt, flags, ...op }) => ({
      seq,
      actor,
      at: Number.isNaN(Date.parse(receivedAt)),
      flags,
      op,
    }));
    expect(known).toEqual(
      ops.map((op, index) => ({
        seq: index + 1,
        actor: team.members.technician.userId,
        at: false,
        flags: expect.any(Array) as string[],
        op,
      })),
    );
  });

  it('in pages joins up to the whole (I9)', async () => {
    const rows: PullRow[] = [];
    let cursor: string | null = null;
    for (let more = true; more;) {
      const page = await pull(phone, `limit=3${cursor === null ? '' : `&cursor=${cursor}`}`);
      rows.push(...page.rows);
      ({ next: cursor, more } = page);
    }
    expect(rows.map(({ opId }) => opId)).toEqual(ops.map(({ opId }) => opId));
  });

  it.each([
    ['limit=0', 1],
    ['limit=-1', 1],
    ['limit=1000000000', 7],
    ['limit=2', 2],
  ])('with %s is brought to 1…500 (B49)', async (query, count) => {
    expect((await pull(phone, query)).rows).toHaveLength(count);
  });

  it.each([
    ['limit=all', 400, 'limit'],
    ['limit=1.5', 400, 'limit'],
    ['limit=', 400, 'limit'],
    ['cursor=abc', 400, 'cursor'],
    ['cursor=1:-5', 400, 'cursor'],
    ['cursor=', 400, 'cursor'],
    [`cursor=1:${'9'.repeat(1_000_000)}`, 400, 'cursor'],
    ['cursor=2:0', 409, 'epoch-mismatch'],
    ['cursor=0:3', 409, 'epoch-mismatch'],
    ['cursor=1:0&cursor=1:3', 400, 'dup-param'],
    ['cursor[]=1:0', 400, 'param'],
    ['team=x', 400, 'param'],
  ])('with %s is refused (B36, B37, B48, B49)', async (query, status, code) => {
    expect(await problemOf(await get(query))).toEqual([status, code]);
  });

  it('with a cursor from another epoch learns the epoch (B48)', async () => {
    expect(await (await get('cursor=9:3')).json()).toMatchObject({ code: 'epoch-mismatch', epoch: 1 });
  });

  it('from beyond the end is empty and brought back to the end (B48)', async () => {
    expect(await pull(phone, 'cursor=1:999999999')).toMatchObject({ rows: [], next: '1:7', more: false });
    expect(await pull(phone, 'cursor=1:7')).toMatchObject({ rows: [], next: '1:7', more: false });
  });

  it('with another team’s cursor gives only the own team’s rows (B48)', async () => {
    const other = await makeTeam({ name: 'Ossle' });
    const theirs = await enrol(other.members.technician);
    expect(await pull(theirs, 'cursor=1:3')).toMatchObject({ rows: [], next: '1:0' });
  });

  it('is open to a coordinator without a phone, not to a researcher', async () => {
    expect((await get('', team.members.coordinator)).status).toBe(200);
    expect(await problemOf(await get('', team.members.researcher))).toEqual([403, 'role']);
    expect(await problemOf(await callApi(pullRoute, 'GET', {}))).toEqual([401, 'signin']);
  });

  it('with a withdrawn device is refused', async () => {
    const response = await callApi(pullRoute, 'GET', { as: phone.member, headers: { 'x-device': v7() } });
    expect(await problemOf(response)).toEqual([403, 'device-revoked']);
  });
});

describe('“have you got these?”', () => {
  const ask = (body: unknown, headers = phone.headers) =>
    callApi(haveRoute, 'POST', { as: phone.member, body, headers });

  it('names what stands in the log, once each, in the order of the question', async () => {
    const [first, second] = ops;
    const opIds = [v7(), second?.opId, first?.opId, second?.opId];
    const answer = (await (await ask({ opIds })).json()) as object;
    expect(answer).toMatchObject({ protocol: 1, epoch: 1, have: [second?.opId, first?.opId] });
  });

  it('does not count what is only parked: it may be sent again', async () => {
    const op = wireOp({ kind: 'reading.submit', nest: v7(), reading: v7(), body: {} });
    expect((await push(phone, [op])).results[0]?.r).toBe('parked');
    expect(await (await ask({ opIds: [op.opId] })).json()).toMatchObject({ have: [] });
  });

  it.each<[unknown, number, string]>([
    [{ opIds: Array.from({ length: 1_001 }, () => v7()) }, 413, 'batch'],
    [{ opIds: ['x'] }, 400, 'shape'],
    [{ opIds: 'x' }, 400, 'shape'],
    [{}, 400, 'shape'],
    [{ opIds: [], team: 1 }, 400, 'unknown-field'],
  ])('refuses a wrong question: %#', async (body, status, code) => {
    expect(await problemOf(await ask(body))).toEqual([status, code]);
  });

  it('answers 1,000 ids, and none', async () => {
    expect((await ask({ opIds: Array.from({ length: 1_000 }, () => v7()) })).status).toBe(200);
    expect(await (await ask({ opIds: [] })).json()).toMatchObject({ have: [] });
  });

  it('is not for a coordinator', async () => {
    const response = await callApi(haveRoute, 'POST', {
      as: team.members.coordinator,
      body: { opIds: [] },
      headers: phone.headers,
    });
    expect(await problemOf(response)).toEqual([403, 'role']);
  });
});
