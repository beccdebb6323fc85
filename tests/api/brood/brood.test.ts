import { beforeAll, describe, expect, it } from 'vitest';
import * as broodRoute from '@/app/api/nests/[id]/brood/route';
import type { BroodEstimate } from '@/lib/brood/answer';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { decided, lock, settle } from '@/tests/support/api/decide';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Marks } from '@/tests/support/n12';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

async function brood(nest: string, query = 'asOf=2026-06-16', as = team.members.technician): Promise<BroodEstimate> {
  const response = await callApi(broodRoute, 'GET', { as, params: { id: nest }, query });
  if (response.status !== 200) throw new Error(`expected an estimate, got ${response.status} ${await response.text()}`);
  return (await response.json()) as BroodEstimate;
}

const stored = (nest: string) =>
  database().models.Estimate.findAll({ where: { team_id: toBinary(team.teamId), nest_id: toBinary(nest) }, raw: true });

/** A nest with a field reading of N12 on 16 June. */
async function n12() {
  const nest = await makeNest(team, { code: 'N12' });
  const visit = await makeVisit(team, nest);
  const reading = await makeReading(team, { nest, visit, marks: n12Marks('field') });
  return { nest, visit, reading };
}

describe('GET /api/nests/<id>/brood', () => {
  it('gives ranges for every cell, in dates of the nest and instants, with its assumptions', async () => {
    const { nest, reading } = await n12();
    const answer = await brood(nest, 'asOf=2026-06-16T12:00:00Z');
    expect(answer).toMatchObject({ asOf: '2026-06-16T12:00:00.000Z', zone: 'America/New_York', readings: [reading] });
    expect(answer.cells).toHaveLength(33);
    const capped = answer.cells[0]?.emerges;
    const at = capped ? [capped.p95[0], capped.p80[0], capped.median, capped.p80[1], capped.p95[1]] : [];
    expect(at).toHaveLength(5);
    expect([...at].sort()).toEqual(at);
    expect(answer.inputDigest).toMatch(/^[0-9a-f]{64}$/);
    expect(answer.assumptions.length).toBeGreaterThan(0);
  });

  it('looks at the final reading once there is one, and is another estimate then', async () => {
    const { nest, reading } = await n12();
    const before = await brood(nest);
    const { reading: final } = await decided(
      await settle(team.members.biologist, reading, [{ q: 0, r: 0, state: 'egg' }]),
    );
    const after = await brood(nest);
    expect(before.readings).toEqual([reading]);
    expect(after.readings).toEqual([final]);
    expect([before.cells[0]?.state, after.cells[0]?.state]).toEqual(['capped', 'egg']);
    expect(after.inputDigest).not.toBe(before.inputDigest);
  });

  it('takes one reading a visit, field before second, and dates a photo by the visit', async () => {
    const { nest, visit, reading } = await n12();
    await makeReading(team, {
      nest,
      visit,
      kind: 'second',
      openedAt: '2026-08-01T09:00:00.000-04:00',
      marks: n12Marks('blind'),
    });
    expect((await brood(nest)).readings).toEqual([reading]);
    const other = await makeNest(team, { code: 'P' });
    const second = await makeReading(team, {
      nest: other,
      visit: await makeVisit(team, other),
      kind: 'second',
      openedAt: '2026-08-01T09:00:00.000-04:00',
      marks: n12Marks('field'),
    });
    const fromPhoto = await brood(other);
    expect(fromPhoto.readings).toEqual([second]);
    expect(fromPhoto.cells[0]?.emerges).toEqual((await brood(nest)).cells[0]?.emerges);
  });

  it('does not look at visits after the day it is asked about, nor at archived ones', async () => {
    const { nest, reading } = await n12();
    const later = await makeVisit(team, nest, { startedAt: '2026-06-20T06:00:00.000-04:00' });
    const second = await makeReading(team, { nest, visit: later, marks: n12Marks('final') });
    const mistaken = await makeVisit(team, nest, {
      startedAt: '2026-06-19T06:00:00.000-04:00',
      archivedAt: '2026-06-19T12:00:00Z',
    });
    await makeReading(team, { nest, visit: mistaken, marks: [{ q: 0, r: 0, state: 'dead' }] });
    expect((await brood(nest, 'asOf=2026-06-15')).readings).toEqual([]);
    expect((await brood(nest, 'asOf=2026-06-19')).readings).toEqual([reading]);
    expect((await brood(nest, 'asOf=2026-06-20')).readings).toEqual([reading, second]);
    expect((await brood(nest, 'asOf=2026-06-20T05:59:59-04:00')).readings).toEqual([reading]);
    expect((await brood(nest, 'asOf=2026-06-20T12:00:00+02:00')).readings).toEqual([reading, second]);
    expect((await brood(nest, '')).readings).toEqual([reading, second]);
  });

  it('answers for a nest that nobody has read', async () => {
    const answer = await brood(await makeNest(team));
    expect(answer).toMatchObject({
      cells: [],
      readings: [],
      nest: { founded: null, firstEmergence: null, season: 'grey' },
    });
  });

  it('leaves out what a blind second reader must not see', async () => {
    const { nest, visit, reading } = await n12();
    await lock(team.members.biologist, reading);
    const own = await makeReading(team, {
      nest,
      visit,
      kind: 'second',
      submittedAt: null,
      marks: [{ q: 0, r: 0, state: 'egg' }],
    });
    const blind = await brood(nest, 'asOf=2026-06-16', team.members.reviewer);
    expect(blind.readings).toEqual([own]);
    expect(blind.cells).toHaveLength(1);
    expect((await brood(nest)).cells).toHaveLength(33);
  });

  it('keeps each estimate once by its input, with the versions that made it', async () => {
    const { nest, reading } = await n12();
    const first = await brood(nest);
    await Promise.all([brood(nest), brood(nest), brood(nest, 'asOf=2026-06-16T12:00:00Z')]);
    const [row, ...more] = await stored(nest);
    expect(more).toEqual([]);
    expect(row?.input_digest.toString('hex')).toBe(first.inputDigest);
    expect(JSON.parse(row?.answer ?? '')).toEqual(first);
    expect(row).toMatchObject({ settings_version: 0, model_version: `${first.model.name} ${first.model.version}` });
    await settle(team.members.biologist, reading, [{ q: 0, r: 0, state: 'egg' }]);
    await brood(nest);
    expect(await stored(nest)).toHaveLength(2);
  });

  it('uses the team’s latest settings and durations, and names their version', async () => {
    const own = await makeTeam({ name: 'With settings' });
    const nest = await makeNest(own);
    await makeReading(own, { nest, visit: await makeVisit(own, nest), marks: [{ q: 0, r: 0, state: 'capped' }] });
    const by = own.members.technician;
    const before = await brood(nest, undefined, by);
    const { SettingsVersion, DurationSet } = database().models;
    for (const version of [1, 2]) {
      const settings = JSON.stringify({
        lossCapped: { value: 0.2, trust: 'assumption', source: 'a trial' },
        nonsense: 1,
        lossEgg: 'high',
      });
      await SettingsVersion.create({
        team_id: toBinary(own.teamId),
        version,
        settings,
        signed_by: null,
        signed_at: new Date(0),
      });
    }
    const days = { egg_days: 22, larva_days: 40, capped_days: 28, reference_c: 25, trust: 'medium', source: 'a trial' };
    await DurationSet.create({ team_id: toBinary(own.teamId), version: 2, taxon: 'Polistes fuscatus', ...days });
    const after = await brood(nest, undefined, by);
    expect([before.settings.version, after.settings.version]).toEqual([DEFAULT_SETTINGS.version, '2']);
    expect(after.durations).toMatchObject({
      taxon: 'Polistes fuscatus',
      egg: 22,
      larva: 40,
      capped: 28,
      source: 'a trial',
    });
    expect(after.cells[0]?.lost.probability).toBeGreaterThan(2 * (before.cells[0]?.lost.probability ?? 1));
    expect(after.inputDigest).not.toBe(before.inputDigest);
  });

  it.each([
    'yesterday',
    '2026-02-30',
    '2026-06-16T12:00:00',
    '2026-13-01T00:00:00Z',
    '1781602867120',
    '2026-06-16T25:00:00Z',
  ])('answers 400 to asOf=%s', async (asOf) => {
    const { nest } = await n12();
    const response = await callApi(broodRoute, 'GET', {
      as: team.members.technician,
      params: { id: nest },
      query: `asOf=${asOf}`,
    });
    expect(await problemOf(response)).toEqual([400, 'param']);
  });

  it('answers 404 for an unknown nest, and keeps nothing', async () => {
    const response = await callApi(broodRoute, 'GET', {
      as: team.members.technician,
      params: { id: '00000000-0000-7000-8000-000000000000' },
    });
    expect(await problemOf(response)).toEqual([404, 'not-found']);
  });
});
