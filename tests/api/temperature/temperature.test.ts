import { beforeAll, describe, expect, it } from 'vitest';
import * as broodRoute from '@/app/api/nests/[id]/brood/route';
import * as fileRoute from '@/app/api/nests/[id]/temperature/[record]/route';
import * as removeRoute from '@/app/api/nests/[id]/temperature/[record]/remove/route';
import * as previewRoute from '@/app/api/nests/[id]/temperature/preview/route';
import * as temperatureRoute from '@/app/api/nests/[id]/temperature/route';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { NestTemperature } from '@/lib/server/queries/temperature/nest-temperature';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

/** A logger's file: hours of 2 June 2026, New York time, one temperature each. */
function file(temperatures: readonly number[]): string {
  const hour = (i: number) => `2026-06-02 ${String(i).padStart(2, '0')}:00`;
  return ['time,temp °C', ...temperatures.map((celsius, i) => `${hour(i)},${celsius}`)].join('\r\n');
}

const nestOfTeam = () => makeNest(team, { code: 'T1', place: { lat: 43.6, lon: -77.6, accuracyM: 5 } });

async function keep(nest: string, body: object, as: TestMember = team.members.technician): Promise<Response> {
  return callApi(temperatureRoute, 'POST', { as, params: { id: nest }, body });
}

async function kept(nest: string, body: object): Promise<string> {
  const response = await keep(nest, body);
  expect(response.status).toBe(200);
  return ((await response.json()) as { id: string }).id;
}

async function shown(nest: string): Promise<NestTemperature> {
  const response = await callApi(temperatureRoute, 'GET', { as: team.members.researcher, params: { id: nest } });
  return (await response.json()) as NestTemperature;
}

async function digestOf(nest: string): Promise<string> {
  const call = { as: team.members.technician, params: { id: nest }, query: 'asOf=2026-06-20' };
  const answer = await (await callApi(broodRoute, 'GET', call)).json();
  return (answer as { inputDigest: string }).inputDigest;
}

describe('a temperature file of a nest', () => {
  it('is shown as recognised before anything is kept', async () => {
    const nest = await nestOfTeam();
    const body = { text: file([15, 16, 16, 43]) };
    const call = { as: team.members.technician, params: { id: nest }, body };
    const answer = await (await callApi(previewRoute, 'POST', call)).json();
    expect(answer).toMatchObject({
      kind: 'read',
      layout: { kind: 'logger', unit: 'C', unitFrom: 'file', columns: { time: 'time', temperature: 'temp °C' } },
      ...{ count: 4, lowest: 15, highest: 43, gaps: 0, notes: [] },
      from: '2026-06-02T04:00:00.000Z',
      warnings: [expect.stringContaining('highest 43.0 °C')],
    });
    expect(await shown(nest)).toMatchObject({ kind: 'none', days: [], records: [] });
  });

  it('is kept with its text and hash, and can be fetched as it came', async () => {
    const nest = await nestOfTeam();
    const text = file([20, 20, 20]);
    const id = await kept(nest, { text, fileName: 'eaves "1".csv' });
    const answer = await shown(nest);
    expect(answer).toMatchObject({ kind: 'logger', zone: 'America/New_York', limitC: 42, referenceC: 25 });
    expect(answer.records).toMatchObject([{ id, source: 'file', size: 3, keptBy: 'The technician', removed: null }]);
    const params = { id: nest, record: id };
    const response = await callApi(fileRoute, 'GET', { as: team.members.researcher, params });
    expect(await response.text()).toBe(text);
    expect(response.headers.get('content-disposition')).toBe('attachment; filename="eaves _1_.csv"');
  });

  it('changes the digest of the estimate, and taking it out changes it back', async () => {
    const nest = await nestOfTeam();
    await makeReading(team, { nest, visit: await makeVisit(team, nest), marks: [{ q: 0, r: 0, state: 'egg' }] });
    const before = await digestOf(nest);
    const record = await kept(nest, { text: file([20, 21]) });
    const withRecord = await digestOf(nest);
    expect(withRecord).not.toBe(before);
    await kept(nest, { text: file([20, 22, 23]) });
    expect(await digestOf(nest)).not.toBe(withRecord);
    const remove = (id: string) =>
      callApi(removeRoute, 'POST', {
        as: team.members.technician,
        params: { id: nest, record: id },
        body: { reason: 'Wrong logger.' },
      });
    expect((await remove(record)).status).toBe(200);
    const [, other] = (await shown(nest)).records;
    await remove(other?.id ?? '');
    expect(await digestOf(nest)).toBe(before);
    expect(await problemOf(await remove(record))).toEqual([409, 'temperature-removed']);
  });

  it('stays on file with the reason when another replaces it, and the audit chain says so', async () => {
    const nest = await nestOfTeam();
    const old = await kept(nest, { text: file([20, 20]) });
    const replaces = { id: old, reason: 'The clock of the logger was wrong.' };
    const id = await kept(nest, { text: file([20, 25]), replaces });
    const { records, days } = await shown(nest);
    expect(records.map((record) => [record.id, record.removed?.reason ?? null])).toEqual([
      [old, replaces.reason],
      [id, null],
    ]);
    expect(days[0]).toMatchObject({ date: '2026-06-02', min: 20, max: 25 });
    const chain = await database().models.AuditEntry.findAll({
      where: { team_id: toBinary(team.teamId), subject_id: [toBinary(old), toBinary(id)] },
      order: [['seq', 'ASC']],
      raw: true,
    });
    expect(chain.map(({ action }) => action)).toEqual(['temperature.keep', 'temperature.remove', 'temperature.keep']);
    expect(chain[1]?.detail).toContain(replaces.reason);
  });

  it('is not kept twice while it is in force', async () => {
    const nest = await nestOfTeam();
    await kept(nest, { text: file([20, 20]) });
    expect(await problemOf(await keep(nest, { text: file([20, 20]) }))).toEqual([409, 'temperature-kept']);
    expect((await shown(nest)).records).toHaveLength(1);
  });

  it('is refused with the reason when it cannot be read, or a question is open', async () => {
    const nest = await nestOfTeam();
    const refused = async (body: object) => (await (await keep(nest, body)).json()) as { code: string; detail: string };
    expect(await refused({ text: 'nothing' })).toMatchObject({ code: 'temperature-file', status: 422 });
    const text = 'd,°C\n03/06/2026 05:00,20';
    expect((await refused({ text })).detail).toContain('Which is it?');
    expect((await keep(nest, { text, answers: { order: 'dmy' } })).status).toBe(200);
  });

  it('may be larger than other requests: a season in steps of ten minutes', async () => {
    const nest = await nestOfTeam();
    const start = Date.parse('2026-05-01T00:00:00Z');
    const line = (i: number) => `${new Date(start + i * 600_000).toISOString()},${(20 + Math.sin(i)).toFixed(2)}`;
    const text = ['time,temp °C', ...Array.from({ length: 17_000 }, (_, i) => line(i))].join('\n');
    await kept(nest, { text });
    expect((await shown(nest)).days).toHaveLength(119);
  }, 30_000);
});

describe('lowest and highest noted by hand', () => {
  const day = (date: string, min: number, max: number) => ({ date, min, max });

  it('count until a logger does, and a later note of a day replaces an earlier one', async () => {
    const nest = await nestOfTeam();
    await kept(nest, { days: [day('2026-06-01', 12, 24), day('2026-06-02', 12, 25)] });
    await kept(nest, { days: [day('2026-06-02', 13, 26)] });
    const { kind, days } = await shown(nest);
    expect([kind, days.map(({ min, max }) => [min, max])]).toEqual([
      'daily',
      [
        [12, 24],
        [13, 26],
      ],
    ]);
    await kept(nest, { text: file([20, 20]) });
    expect((await shown(nest)).kind).toBe('logger');
  });

  it.each([
    ['the lowest above the highest', [day('2026-06-01', 25, 12)]],
    ['a day that is not', [day('2026-02-30', 12, 25)]],
    ['a day twice', [day('2026-06-01', 12, 25), day('2026-06-01', 12, 26)]],
    ['a temperature that cannot be', [day('2026-06-01', 12, 250)]],
    ['no day', []],
  ])('are refused with %s', async (_name, days) => {
    expect(await problemOf(await keep(await nestOfTeam(), { days }))).toEqual([400, 'shape']);
  });

  it('may be kept by a coordinator and not by a researcher', async () => {
    const nest = await nestOfTeam();
    const days = [day('2026-06-01', 12, 24)];
    expect((await keep(nest, { days }, team.members.coordinator)).status).toBe(200);
    expect(await problemOf(await keep(nest, { days }, team.members.researcher))).toEqual([403, 'role']);
  });
});
