import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import * as healthRoute from '@/app/api/health/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import { authSecret, readDataFile, writeDataFile } from '@/lib/server/env';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { type Phone, enrol, postPush, pushBody } from '@/tests/support/push/phone';

let team: TestTeam;
let phone: Phone;
let folder: string;

beforeAll(async () => {
  team = await makeTeam();
  phone = await enrol(team.members.technician);
});

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'undereave-'));
  vi.stubEnv('NEXTAUTH_SECRET', authSecret());
  vi.stubEnv('DATA_DIR', folder);
});

afterEach(() => {
  vi.unstubAllEnvs();
  rmSync(folder, { recursive: true });
});

describe('a database restored from a backup', () => {
  it('on a new data folder is taken as it is, and its epoch written down', async () => {
    expect((await postPush(phone, pushBody([]))).status).toBe(200);
    expect(readDataFile('epoch')).toBe('1');
    expect(await (await callApi(healthRoute, 'GET')).json()).toEqual({ ok: true, db: true, photos: true, epoch: 1 });
  });

  it('whose epoch was not moved on takes no work until that is done; reading goes on (F46)', async () => {
    writeDataFile('epoch', '2');
    const refused = await postPush(phone, pushBody([]));
    expect(await problemOf(refused)).toEqual([503, 'busy']);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await callApi(pullRoute, 'GET', { as: phone.member })).status).toBe(200);
    const health = await callApi(healthRoute, 'GET');
    expect(health.status).toBe(503);
    expect(await health.json()).toEqual({ ok: false, db: true, photos: true, epoch: 1 });
    writeDataFile('epoch', '1');
    expect((await postPush(phone, pushBody([]))).status).toBe(200);
  });
});
