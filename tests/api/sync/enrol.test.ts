import { beforeAll, describe, expect, it } from 'vitest';
import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import { isUuidText } from '@/lib/kit/uuid';
import type { EnrolResponse } from '@/lib/protocol/enrol';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

const enrol = (body: unknown, as = team.members.technician) => callApi(enrolRoute, 'POST', { as, body });

describe('an enrolment', () => {
  it('gives the phone an id and a secret of its own, and the epoch', async () => {
    const answers = await Promise.all(
      [1, 2].map(async () => (await (await enrol({ label: 'Pixel 7 of Senna' })).json()) as EnrolResponse),
    );
    const [first, second] = answers;
    expect(first).toMatchObject({ epoch: 1, schema: 1 });
    expect(isUuidText(first?.deviceId)).toBe(true);
    expect(Buffer.from(first?.deviceKey ?? '', 'base64url')).toHaveLength(32);
    expect(first?.deviceId).not.toBe(second?.deviceId);
    expect(first?.deviceKey).not.toBe(second?.deviceKey);
    const row = await database().models.Device.findOne({
      where: { id: toBinary(first?.deviceId ?? '') },
      rejectOnEmpty: true,
    });
    expect(row).toMatchObject({
      label: 'Pixel 7 of Senna',
      revoked_at: null,
      user_id: toBinary(team.members.technician.userId),
    });
  });

  it.each<[unknown, number, string]>([
    [{}, 400, 'shape'],
    [{ label: '' }, 400, 'shape'],
    [{ label: 'x'.repeat(201) }, 400, 'shape'],
    [{ label: 'a\u0000b' }, 400, 'shape'],
    [{ label: '\ud800' }, 400, 'shape'],
    [{ label: 5 }, 400, 'shape'],
    [{ label: 'x', userId: 'y' }, 400, 'unknown-field'],
  ])('refuses a wrong body: %#', async (body, status, code) => {
    expect(await problemOf(await enrol(body))).toEqual([status, code]);
  });

  it('is for those who record at the nest or in the lab', async () => {
    const statuses = await Promise.all(
      Object.values(team.members).map(async (as) => [as.role, (await enrol({ label: 'x' }, as)).status]),
    );
    expect(new Map(statuses as [string, number][])).toEqual(
      new Map([
        ['technician', 200],
        ['reviewer', 200],
        ['biologist', 200],
        ['coordinator', 403],
        ['researcher', 403],
      ]),
    );
  });
});
