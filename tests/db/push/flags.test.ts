import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { type WireOpInput, wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

/** Pushes operations that must all be applied, and returns the flags of each. */
async function flagsOf(...ops: Op[]): Promise<string[]> {
  expect(wordsOf(await pushAs(team, team.members.technician, ops))).toEqual(ops.map(() => 'applied'));
  const where = { team_id: toBinary(team.teamId), op_id: ops.map(({ opId }) => toBinary(opId)) };
  return (await database().models.Op.findAll({ where, order: ['seq'] })).map((row) => row.flags);
}

async function opened() {
  const ids = freshIds();
  await pushAs(team, team.members.technician, openingOps(ids, 'N1'));
  return ids;
}

function nestAt(place: WireOpInput['body'] | null, more: Partial<WireOpInput> = {}): Op {
  return wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N9', place }, ...more });
}

const time = (wall: string, mono = 1, skewMs: number | null = null) => ({
  wall,
  mono,
  boot: '5f0c3a52-8a2f-4d0c-9f0a-0a6f5a1c2b3d',
  skewMs,
});

describe('flags', () => {
  it('clock: a doubtful clock is taken and flagged, never refused (B38, I20)', async () => {
    const walls = [
      '2026-06-16T24:00:00-04:00',
      '0001-01-01T00:00:00Z',
      '9999-12-31T23:59:59-05:00',
      '2026-06-16T05:41:07',
      '2016-12-31T23:59:60Z',
      '2027-07-21T05:41:07-04:00',
    ];
    expect(await flagsOf(...walls.map((wall) => nestAt(null, { at: time(wall) })))).toEqual(walls.map(() => 'clock'));
    expect(await flagsOf(nestAt(null, { at: time('2026-06-16T05:41:07-04:00', 1, 840_000) }))).toEqual(['clock']);
  });

  it('mono: a monotonic reading that is negative or goes back (B40)', async () => {
    const wall = '2026-06-16T05:41:07-04:00';
    const ops = [
      nestAt(null, { at: time(wall, -5) }),
      nestAt(null, { at: time(wall, 50) }),
      nestAt(null, { at: time(wall, 20) }),
    ];
    expect(await flagsOf(...ops)).toEqual(['mono', '', 'mono']);
  });

  it('place: null island and swapped coordinates (B42)', async () => {
    const places: WireOpInput['body'][] = [
      { lat: 0, lon: 0 },
      { lat: -77.6, lon: 43.6 },
      { lat: 43.598, lon: -77.605, accuracyM: 4 },
    ];
    expect(await flagsOf(...places.map((place) => nestAt(place)))).toEqual(['place', 'place', '']);
  });

  it('late: marks and retractions after the reading was submitted', async () => {
    const ids = await opened();
    const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
    const submit = wireOp({ kind: 'reading.submit', ...ids, body: {} });
    const late = markOp(ids, { q: 0, r: -1, state: 'egg' });
    const retraction = wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } });
    expect(await flagsOf(mark, submit, late, retraction)).toEqual(['', '', 'late', 'late']);
  });

  it('late: marks after the reading made from it was locked', async () => {
    const ids = await opened();
    await database().models.Reading.create({
      team_id: toBinary(team.teamId),
      id: toBinary(v7()),
      nest_id: toBinary(ids.nest),
      visit_id: toBinary(ids.visit),
      kind: 'final',
      source: 'phone',
      aid: null,
      light: null,
      opened_by: toBinary(team.members.reviewer.userId),
      opened_at: new Date('2026-06-17T00:00:00Z'),
      opened_at_text: '2026-06-17T00:00:00Z',
      submitted_at: null,
      based_on: toBinary(ids.reading),
      base_seq: 1,
      version: 2,
      locked_version: 2,
    });
    expect(await flagsOf(markOp(ids, { q: 0, r: 0, state: 'egg' }))).toEqual(['late']);
  });

  it('archived: what arrives for a nest or visit that was put away (B46)', async () => {
    const ids = await opened();
    const archive = wireOp({ kind: 'entity.archive', ...ids, reading: null, body: { entity: 'visit' } });
    expect(await flagsOf(archive, markOp(ids, { q: 0, r: 0, state: 'egg' }))).toEqual(['', 'archived']);
    const visit = await database().models.Visit.findOne({
      where: { team_id: toBinary(team.teamId), id: toBinary(ids.visit) },
    });
    expect(visit?.archived_at).toEqual(new Date('2026-06-16T05:41:07.120-04:00'));
  });
});
