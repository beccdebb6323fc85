import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import * as pushRoute from '@/app/api/sync/v1/push/route';
import { MAX_BODY_BYTES } from '@/lib/protocol/limits';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { wordsOf } from '@/tests/support/push/push-as';
import { type Phone, enrol, postPush, push, pushBody } from '@/tests/support/push/phone';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;
let phone: Phone;

beforeAll(async () => {
  team = await makeTeam();
  phone = await enrol(team.members.technician);
});

const stored = () => database().models.Op.count({ where: { team_id: toBinary(team.teamId) } });
const nest = () => wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N1' } });
const text = (ops: string) => `{"protocol":1,"schema":1,"epoch":1,"ops":${ops}}`;

/** Bodies that are refused whole, by their number in the catalogue of bad input. */
const REFUSED: readonly [
  what: string,
  sent: { body: unknown; headers?: Record<string, string> },
  expected: [number, string],
][] = [
  ['B01 an empty body', { body: '' }, [400, 'empty']],
  ['B01 white space', { body: ' \n' }, [400, 'empty']],
  ['B02 no JSON', { body: 'ops' }, [400, 'json']],
  ['B02 JSON cut off', { body: '{"protocol":1,"ops":[' }, [400, 'json']],
  ['B03 a list', { body: '[]' }, [400, 'shape']],
  ['B03 a text', { body: '"push"' }, [400, 'shape']],
  ['B03 a number', { body: '7' }, [400, 'shape']],
  ['B03 null', { body: 'null' }, [400, 'shape']],
  ['B04 text/plain', { body: pushBody([]), headers: { 'content-type': 'text/plain' } }, [415, 'content-type']],
  [
    'B05 UTF-16',
    { body: pushBody([]), headers: { 'content-type': 'application/json; charset=utf-16' } },
    [415, 'content-type'],
  ],
  ['B06 257 KB', { body: text(`[${' '.repeat(MAX_BODY_BYTES)}]`) }, [413, 'body']],
  ['B06 a length of 1 GB', { body: pushBody([]), headers: { 'content-length': String(2 ** 30) } }, [413, 'body']],
  ['B07 gzip', { body: pushBody([]), headers: { 'content-encoding': 'gzip' } }, [415, 'content-type']],
  ['B08 nested 100,000 deep', { body: '['.repeat(100_000) }, [400, 'json']],
  ['B09 a member twice', { body: '{"protocol":1,"protocol":1}' }, [400, 'dup-key']],
  ['B09 a member of an operation twice', { body: text('[{"opId":"a","opId":"b"}]') }, [400, 'dup-key']],
  [
    'B10 __proto__ in the envelope',
    { body: '{"__proto__":{"x":1},"protocol":1,"schema":1,"epoch":1,"ops":[]}' },
    [400, 'unknown-field'],
  ],
  [
    'B10 constructor in the envelope',
    { body: pushBody([], { constructor: { prototype: 1 } }) },
    [400, 'unknown-field'],
  ],
  ['B11 a team in the envelope', { body: pushBody([], { teamId: v7() }) }, [400, 'unknown-field']],
  ['B12 101 operations', { body: pushBody(Array(101).fill(null)) }, [413, 'batch']],
  ['B25 NaN', { body: text('[{"q":NaN}]') }, [400, 'json']],
  ['B25 Infinity', { body: text('[-Infinity]') }, [400, 'json']],
  ['B26 an epoch of 1e309', { body: '{"protocol":1,"schema":1,"epoch":1e309,"ops":[]}' }, [400, 'shape']],
  ['a protocol of 2', { body: pushBody([], { protocol: 2 }) }, [400, 'shape']],
  ['no operations at all', { body: { protocol: 1, schema: 1, epoch: 1 } }, [400, 'shape']],
  ['operations that are no list', { body: pushBody([], { ops: {} }) }, [400, 'shape']],
  ['an epoch in words', { body: pushBody([], { epoch: '1' }) }, [400, 'shape']],
  ['B71 without X-Sync', { body: pushBody([]), headers: { 'x-sync': '0' } }, [403, 'csrf']],
  ['B71 from another origin', { body: pushBody([]), headers: { origin: 'https://evil.example' } }, [403, 'csrf']],
  ['B71 from another site', { body: pushBody([]), headers: { 'sec-fetch-site': 'cross-site' } }, [403, 'csrf']],
];

describe('a push that is refused whole', () => {
  it.each(REFUSED)('%s', async (_what, { body, headers }, expected) => {
    const before = await stored();
    const response = await postPush(phone, body, headers);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(await problemOf(response)).toEqual(expected);
    expect(await stored()).toBe(before);
  });

  it('B02 with bytes that are no UTF-8', async () => {
    const bytes = new Uint8Array([0x22, 0xc3, 0x28, 0x22]);
    const headers = {
      cookie: phone.member.cookie,
      'x-sync': '1',
      'content-type': 'application/json',
      ...phone.headers,
    };
    const request = new Request('http://127.0.0.1:3000/api/sync/v1/push', { method: 'POST', headers, body: bytes });
    expect(await problemOf(await pushRoute.POST(request))).toEqual([400, 'json']);
  });

  it('B06 without a length, read no further than the limit', async () => {
    let sent = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull(controller) {
        sent += 16_384;
        controller.enqueue(new Uint8Array(16_384).fill(0x20));
      },
    });
    const headers = {
      cookie: phone.member.cookie,
      'x-sync': '1',
      'content-type': 'application/json',
      ...phone.headers,
    };
    const init = { method: 'POST', headers, body: endless, duplex: 'half' };
    const response = await pushRoute.POST(new Request('http://127.0.0.1:3000/api/sync/v1/push', init));
    expect(await problemOf(response)).toEqual([413, 'body']);
    expect(response.headers.get('connection')).toBe('close');
    expect(sent).toBeLessThan(MAX_BODY_BYTES + 100_000);
  });

  it('names the epoch of the office when the phone has another (409)', async () => {
    const response = await postPush(phone, pushBody([nest()], { epoch: 7 }));
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({
      status: 409,
      code: 'epoch-mismatch',
      epoch: 1,
      requestId: expect.any(String),
    });
  });
});

describe('who may push', () => {
  it('needs a session (401), a right (403 role) and an enrolled device', async () => {
    const body = pushBody([]);
    const { coordinator, researcher, technician, technician2, reviewer } = team.members;
    expect(await problemOf(await callApi(pushRoute, 'POST', { body, headers: phone.headers }))).toEqual([
      401,
      'signin',
    ]);
    for (const as of [coordinator, researcher]) {
      expect(await problemOf(await callApi(pushRoute, 'POST', { as, body, headers: phone.headers }))).toEqual([
        403,
        'role',
      ]);
    }
    expect(await problemOf(await callApi(pushRoute, 'POST', { as: technician, body }))).toEqual([400, 'device']);
    for (const device of ['phone', v7()]) {
      expect(await problemOf(await postPush(phone, body, { 'x-device': device }))).toEqual([403, 'device-revoked']);
    }
    for (const as of [technician2, reviewer]) {
      expect(await problemOf(await callApi(pushRoute, 'POST', { as, body, headers: phone.headers }))).toEqual([
        403,
        'device-revoked',
      ]);
    }
  });

  it('ends for a device the moment it is withdrawn (F59)', async () => {
    const stolen = await enrol(team.members.technician, 'stolen');
    expect((await push(stolen, [nest()])).results[0]?.r).toBe('applied');
    await database().models.Device.update({ revoked_at: new Date() }, { where: { id: toBinary(stolen.deviceId) } });
    expect(await problemOf(await postPush(stolen, pushBody([nest()])))).toEqual([403, 'device-revoked']);
  });

  it('a device of another team is an unknown one', async () => {
    const other = await makeTeam({ name: 'Ossle' });
    const theirs = await enrol(other.members.technician);
    expect(await problemOf(await postPush(phone, pushBody([]), theirs.headers))).toEqual([403, 'device-revoked']);
  });
});

describe('a push that is taken', () => {
  it('answers each operation in the order of the request, with time, epoch and safe mark', async () => {
    const ids = freshIds();
    const ops = openingOps(ids, 'N2');
    const answer = await push(phone, [...ops, ops[0], { nonsense: true }]);
    expect(Object.keys(answer)).toEqual(['protocol', 'epoch', 'serverTime', 'safeSeq', 'results']);
    expect(answer).toMatchObject({ protocol: 1, epoch: 1, safeSeq: 0 });
    expect(new Date(answer.serverTime).toISOString()).toBe(answer.serverTime);
    expect(wordsOf(answer.results)).toEqual(['applied', 'applied', 'applied', 'duplicate', 'quarantined shape']);
    expect(answer.results.map(({ opId }) => opId)).toEqual([...ops.map(({ opId }) => opId), ops[0]?.opId, null]);
  });

  it('may be empty (B12)', async () => {
    expect((await push(phone, [])).results).toEqual([]);
  });

  it('keeps the text of what it sets aside exactly as it came', async () => {
    const odd = '{ "opId" : "X", "n": 1.50, "note":"\\ud800" }';
    const response = await postPush(phone, text(`[ ${odd} ]`));
    expect(response.status).toBe(200);
    const rows = await database().models.QuarantinedOp.findAll({ where: { team_id: toBinary(team.teamId) } });
    expect(rows.map(({ raw }) => raw)).toContain(odd);
  });

  it('sets aside prototypes and further members inside an operation (B10, B11)', async () => {
    const op = JSON.stringify(nest());
    const members = [
      '"__proto__":{"polluted":true}',
      '"constructor":{"prototype":{}}',
      '"teamId":"x"',
      '"actor":"x"',
      '"role":"x"',
      '"seq":1',
      '"reviewed":true',
    ];
    const response = await postPush(
      phone,
      text(`[${members.map((member) => op.replace('{', `{${member},`)).join(',')}]`),
    );
    const { results } = (await response.json()) as { results: { r: string; code: string }[] };
    expect(results.map(({ r, code }) => `${r} ${code}`)).toEqual(members.map(() => 'quarantined unknown-field'));
    expect('polluted' in {}).toBe(false);
  });

  it('notes which device sent it, whatever the operation says', async () => {
    const op = nest();
    await push(phone, [op]);
    const row = await database().models.Op.findOne({
      where: { team_id: toBinary(team.teamId), op_id: toBinary(op.opId) },
    });
    expect(row?.device_id).toEqual(toBinary(phone.deviceId));
    expect(JSON.parse(row?.op ?? '{}')).toMatchObject({ deviceId: op.deviceId });
  });

  it('takes every kind of writing and gives it back byte for byte (B28, B31, B33)', async () => {
    const ids = freshIds();
    const note = `e\u0301 \u00e9 👩‍🔬 \u202eover <script>alert(1)</script> {{x}} \${y} ' OR 1=1-- "; DROP \u05d0\u200f`;
    const op = markOp(ids, { q: 0, r: 0, state: 'egg', note });
    expect(wordsOf((await push(phone, [...openingOps(ids, 'N3'), op])).results).at(-1)).toBe('applied');
    const mark = await database().models.Mark.findOne({
      where: { team_id: toBinary(team.teamId), op_id: toBinary(op.opId) },
    });
    expect(mark?.note).toBe(note);
  });
});

describe('a device that never stops', () => {
  it('is asked to wait after 1,000 pushes in a minute, and only that device (B80)', async () => {
    const busy = await enrol(team.members.technician, 'busy');
    const { createHash } = await import('node:crypto');
    const subject = createHash('sha256').update(`push:${busy.deviceId}`).digest();
    const at = new Date();
    await database().models.LoginAttempt.bulkCreate(
      Array.from({ length: 999 }, () => ({ id: toBinary(v7()), subject, failed: false, at })),
    );
    expect((await postPush(busy, pushBody([]))).status).toBe(200);
    const refused = await postPush(busy, pushBody([]));
    expect(await problemOf(refused)).toEqual([429, 'too-many']);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await postPush(phone, pushBody([]))).status).toBe(200);
  });
});
