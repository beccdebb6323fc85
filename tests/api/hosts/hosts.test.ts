import { v7 } from 'uuid';
import { beforeAll, expect, it } from 'vitest';
import * as hostsRoute from '@/app/api/hosts/route';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;
const ids = { lock: v7(), orchard: v7() };

beforeAll(async () => {
  team = await makeTeam();
  const own = { team_id: toBinary(team.teamId), capacity: 2 };
  const { Host } = database().models;
  const place = { place_name: 'Skelder lock', lat: 43.653, lon: -77.561 };
  await Host.create({
    ...own,
    ...place,
    id: toBinary(ids.lock),
    code: 'H4',
    name: 'R. Tarn',
    note: 'no signal',
    withdrawn_on: '2026-07-03',
  });
  const unplaced = { place_name: 'Pellow orchard', lat: null, lon: null };
  await Host.create({
    ...own,
    ...unplaced,
    id: toBinary(ids.orchard),
    code: 'H1',
    name: 'Greta Ansby',
    note: null,
    withdrawn_on: null,
  });
});

async function hostsSeenBy(as: TestMember): Promise<unknown> {
  const response = await callApi(hostsRoute, 'GET', { as });
  expect(response.status).toBe(200);
  return response.json();
}

it('lists the hosts by code', async () => {
  expect(await hostsSeenBy(team.members.coordinator)).toEqual({
    hosts: [
      {
        id: ids.orchard,
        code: 'H1',
        name: 'Greta Ansby',
        placeName: 'Pellow orchard',
        place: null,
        capacity: 2,
        note: null,
        withdrawnOn: null,
      },
      {
        id: ids.lock,
        code: 'H4',
        name: 'R. Tarn',
        placeName: 'Skelder lock',
        place: { lat: 43.653, lon: -77.561, accuracyM: null },
        capacity: 2,
        note: 'no signal',
        withdrawnOn: '2026-07-03',
      },
    ],
  });
});

it('keeps notes about hosts from technicians, who need the way there', async () => {
  expect(await hostsSeenBy(team.members.technician)).toMatchObject({
    hosts: [{}, { code: 'H4', note: null, place: { lat: 43.653 } }],
  });
});

it('is not for researchers', async () => {
  expect(await problemOf(await callApi(hostsRoute, 'GET', { as: team.members.researcher }))).toEqual([403, 'role']);
});
