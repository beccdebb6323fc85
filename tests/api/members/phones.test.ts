import { beforeAll, describe, expect, it, vi } from 'vitest';
import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import * as revokeRoute from '@/app/api/devices/[id]/revoke/route';
import { memberContext } from '@/lib/server/auth/member-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { phones } from '@/lib/server/queries/phones';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

vi.mock('@/lib/server/log/log', () => ({ log: () => undefined, describeError: () => ({}) }));

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

async function enrol(as: TestMember, label = 'Phone'): Promise<string> {
  const response = await callApi(enrolRoute, 'POST', { as, body: { label } });
  return ((await response.json()) as { deviceId: string }).deviceId;
}

const pull = (as: TestMember, id: string, headers: Record<string, string> = {}) =>
  callApi(pullRoute, 'GET', { as, headers: { 'x-device': id, ...headers } });

const revoke = (as: TestMember, id: string, reason = 'Lost') =>
  callApi(revokeRoute, 'POST', { as, params: { id }, body: { reason } });

async function listed(member: TestMember) {
  return phones(await memberContext(team.teamId, member.userId));
}

describe('what a phone says it still holds', () => {
  it('is kept with the phone, and again when it changes', async () => {
    const { technician } = team.members;
    const id = await enrol(technician);
    const unsent = async () => (await listed(technician)).find((phone) => phone.id === id)?.unsent;
    expect(await unsent()).toBeNull();
    for (const count of ['14', '0']) {
      expect((await pull(technician, id, { 'x-unsent': count })).status).toBe(200);
      expect(await unsent()).toBe(Number(count));
    }
  });

  it('is passed over when it is no number, or not said', async () => {
    const { technician } = team.members;
    const id = await enrol(technician);
    await pull(technician, id, { 'x-unsent': '3' });
    for (const nonsense of ['-1', '3.5', 'many', '99999999999', '1e3', '']) {
      expect((await pull(technician, id, { 'x-unsent': nonsense })).status).toBe(200);
    }
    await pull(technician, id);
    expect((await listed(technician)).find((phone) => phone.id === id)?.unsent).toBe(3);
  });
});

describe('a withdrawn phone', () => {
  it('is refused with its next request, and says who withdrew it and why', async () => {
    const { technician, coordinator } = team.members;
    const id = await enrol(technician, 'Phone in the marsh');
    expect((await pull(technician, id)).status).toBe(200);
    expect((await revoke(coordinator, id, 'Lost in the marsh')).status).toBe(200);
    expect(await problemOf(await pull(technician, id))).toEqual([403, 'device-revoked']);
    const phone = (await listed(coordinator)).find((one) => one.id === id);
    expect(phone?.revoked).toMatchObject({ by: 'The coordinator', reason: 'Lost in the marsh' });
    const entry = await database().models.AuditEntry.findOne({ where: { subject_id: toBinary(id) } });
    expect(entry?.action).toBe('device.revoke');
  });

  it('stays withdrawn; the person enrols a new one', async () => {
    const { technician, coordinator } = team.members;
    const id = await enrol(technician);
    await revoke(coordinator, id);
    expect(await problemOf(await revoke(coordinator, id))).toEqual([409, 'revoked']);
    const next = await enrol(technician);
    expect((await pull(technician, next)).status).toBe(200);
    expect(await problemOf(await pull(technician, id))).toEqual([403, 'device-revoked']);
  });

  it('may be one’s own, but not a colleague’s unless one coordinates', async () => {
    const { technician, technician2 } = team.members;
    const own = await enrol(technician);
    expect(await problemOf(await revoke(technician2, own))).toEqual([404, 'not-found']);
    expect((await revoke(technician, own)).status).toBe(200);
  });
});

it('shows each person their own phones, and the coordinator everybody’s', async () => {
  const { technician, technician2, coordinator } = team.members;
  const [a, b] = [await enrol(technician), await enrol(technician2)];
  const ids = async (member: TestMember) => (await listed(member)).map(({ id }) => id);
  expect(await ids(technician)).not.toContain(b);
  expect(await ids(coordinator)).toEqual(expect.arrayContaining([a, b]));
});
