import { beforeAll, describe, expect, it } from 'vitest';
import * as settleRoute from '@/app/api/readings/[id]/settle/route';
import { memberContext } from '@/lib/server/auth/member-context';
import { auditHash } from '@/lib/server/commands/push/write-audit';
import { database } from '@/lib/server/db/database';
import { fromBinary, fromBinaryOrNull, toBinary } from '@/lib/server/db/uuid-binary';
import { readingReview } from '@/lib/server/queries/reading-review';
import { amend, decided, lock, readReading, settle } from '@/tests/support/api/decide';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeMarks, makeReading, makeRetraction } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;
let nest: string;
const EGG = { q: 0, r: 0, state: 'egg' } as const;

beforeAll(async () => {
  team = await makeTeam();
  nest = await makeNest(team);
});

/** A field reading: egg with nectar in the pedicel cell, an unsure medium larva above it. */
async function fieldReading(): Promise<{ id: string; opIds: string[] }> {
  const id = await makeReading(team, { nest, visit: await makeVisit(team, nest) });
  const opIds = await makeMarks(team, id, [
    { ...EGG, nectar: true, at: '2026-06-16T05:41:00.000-04:00' },
    { q: 0, r: -1, state: 'medium', unsure: true, instar: 4 },
  ]);
  return { id, opIds };
}

const settlementCount = () => database().models.Settlement.count({ where: { team_id: toBinary(team.teamId) } });

describe('settle', () => {
  it('makes a final reading beside the observer’s, whose marks stay as they are', async () => {
    const { id, opIds } = await fieldReading();
    const before = await readReading(team.members.technician, id);
    const { reading, version } = await decided(
      await settle(team.members.reviewer, id, [{ q: 0, r: 0, state: 'small' }]),
    );
    expect(version).toBe(1);
    expect(reading).not.toBe(id);
    const final = await readReading(team.members.technician, reading);
    expect(final).toMatchObject({
      kind: 'final',
      nest,
      visit: before.visit,
      source: 'phone',
      observer: 'The reviewer',
      lockedVersion: null,
    });
    expect(final.marks).toEqual([{ ...before.marks[0], state: 'small' }, { ...before.marks[1] }]);
    expect(final.marks[0]).toMatchObject({ opId: opIds[0], at: '2026-06-16T05:41:00.000-04:00', nectar: true });
    expect(await readReading(team.members.technician, id)).toEqual(before);
  });

  it('goes to the one final reading, whether the source or the final one is named', async () => {
    const { id } = await fieldReading();
    const first = await decided(await settle(team.members.reviewer, id, [{ q: 0, r: 0, state: 'small' }]));
    const second = await decided(await settle(team.members.biologist, first.reading, [{ q: 0, r: 0, state: 'empty' }]));
    const third = await decided(await settle(team.members.reviewer, id, [{ q: 5, r: 0, state: 'capped' }]));
    expect([second, third]).toEqual([first, first]);
    const final = await readReading(team.members.reviewer, first.reading);
    expect(final.marks.map(({ cell, state }) => [cell, state])).toEqual([
      [0, 'empty'],
      [1, 'medium'],
      [71, 'capped'],
    ]);
    expect(final.marks.at(-1)).toMatchObject({ opId: null, at: null, nectar: false });
  });

  it('names in each settlement the mark it replaced, by mark not by cell', async () => {
    const { id, opIds } = await fieldReading();
    await settle(team.members.reviewer, id, [
      { q: 0, r: 0, state: 'small', reason: 'The head shows.' },
      { q: 3, r: 0, state: 'egg', reason: 'Missed at the rim.' },
    ]);
    const ctx = await memberContext(team.teamId, team.members.reviewer.userId);
    const { settlements } = await readingReview(ctx, id);
    expect(
      settlements.map(({ q, r, state, reason, settledFrom, actor, version }) => [
        q,
        r,
        state,
        reason,
        settledFrom,
        actor,
        version,
      ]),
    ).toEqual([
      [0, 0, 'small', 'The head shows.', opIds[0], 'The reviewer', 1],
      [3, 0, 'egg', 'Missed at the rim.', null, 'The reviewer', 1],
    ]);
  });

  it('stands on the marks held when it was made; later ones make it stale and do not move it', async () => {
    const { id, opIds } = await fieldReading();
    const { reading } = await decided(await settle(team.members.reviewer, id, [{ q: 0, r: -1, state: 'large' }]));
    const ctx = await memberContext(team.teamId, team.members.reviewer.userId);
    expect((await readingReview(ctx, id)).final).toMatchObject({ id: reading, basedOn: id, stale: false });
    await makeMarks(team, id, [{ q: 0, r: 0, state: 'capped', supersedes: opIds[0] }]);
    await makeRetraction(team, id, opIds[1] ?? '');
    const final = await readReading(team.members.reviewer, reading);
    expect(final.marks.map(({ state }) => state)).toEqual(['egg', 'large']);
    expect((await readReading(team.members.reviewer, id)).marks.map(({ state }) => state)).toEqual(['capped']);
    expect((await readingReview(ctx, reading)).final).toMatchObject({ stale: true });
  });

  it('keeps a reason of 10,000 code points as it was written', async () => {
    const { id } = await fieldReading();
    const reason = `=1 "quoted", \n\t${'\u{1f52c}'.repeat(9_980)} e\u0301`;
    expect((await settle(team.members.reviewer, id, [{ q: 0, r: 0, state: 'small', reason }])).status).toBe(200);
    const ctx = await memberContext(team.teamId, team.members.reviewer.userId);
    expect((await readingReview(ctx, id)).settlements[0]?.reason).toBe(reason);
  });

  it.each<[string, unknown, string]>([
    ['no cells', { cells: [] }, 'shape'],
    ['cells that are no list', { cells: { q: 0 } }, 'shape'],
    ['no member', {}, 'shape'],
    ['a cell twice', { cells: [cell({}), cell({ state: 'small' })] }, 'shape'],
    [
      'a cell twice, once as −0',
      '{"cells":[{"q":0,"r":0,"state":"egg","reason":"x"},{"q":-0,"r":0,"state":"small","reason":"x"}]}',
      'shape',
    ],
    ['a text for a coordinate', { cells: [cell({ q: '0' })] }, 'shape'],
    ['half a coordinate', { cells: [cell({ q: 0.5 })] }, 'shape'],
    ['an address beyond 40', { cells: [cell({ q: 41 })] }, 'shape'],
    ['an address whose sum is beyond 40', { cells: [cell({ q: 30, r: 11 })] }, 'shape'],
    ['a state that is none', { cells: [cell({ state: 'Egg' })] }, 'shape'],
    ['a state in a list', { cells: [cell({ state: ['egg'] })] }, 'shape'],
    ['no reason', { cells: [{ q: 0, r: 0, state: 'egg' }] }, 'shape'],
    ['an empty reason', { cells: [cell({ reason: '' })] }, 'shape'],
    ['a blank reason', { cells: [cell({ reason: ' \n\t' })] }, 'shape'],
    ['a reason of 10,001 code points', { cells: [cell({ reason: 'x'.repeat(10_001) })] }, 'shape'],
    ['a NUL in the reason', { cells: [cell({ reason: 'a\u0000b' })] }, 'shape'],
    ['half a surrogate pair', '{"cells":[{"q":0,"r":0,"state":"egg","reason":"\\ud800"}]}', 'shape'],
    ['a number too large for JSON', '{"cells":[{"q":1e999,"r":0,"state":"egg","reason":"x"}]}', 'shape'],
    ['an unknown member', { cells: [cell({})], version: 3 }, 'unknown-field'],
    ['an unknown member of a cell', { cells: [cell({ actor: 'me' })] }, 'unknown-field'],
    [
      '__proto__',
      '{"cells":[{"q":0,"r":0,"state":"egg","reason":"x","__proto__":{"role":"biologist"}}]}',
      'unknown-field',
    ],
    ['a member twice', '{"cells":[],"cells":[]}', 'dup-key'],
    ['a list at the top', '[]', 'shape'],
    ['broken JSON', '{"cells":[', 'json'],
    ['nothing', '', 'empty'],
  ])('refuses %s and stores nothing', async (_, body, code) => {
    const { id } = await fieldReading();
    const before = await settlementCount();
    const response = await callApi(settleRoute, 'POST', { as: team.members.reviewer, params: { id }, body });
    expect(await problemOf(response)).toEqual([400, code]);
    expect(await settlementCount()).toBe(before);
    const readings = await database().models.Reading.count({
      where: { team_id: toBinary(team.teamId), based_on: toBinary(id) },
    });
    expect(readings).toBe(0);
  });

  it.each([
    ['text/plain', 415, 'content-type'],
    ['application/json; charset=utf-16', 415, 'content-type'],
  ])('refuses a body sent as %s', async (type, status, code) => {
    const { id } = await fieldReading();
    const body = { cells: [cell({})] };
    const response = await callApi(settleRoute, 'POST', {
      as: team.members.reviewer,
      params: { id },
      body,
      headers: { 'content-type': type },
    });
    expect(await problemOf(response)).toEqual([status, code]);
  });
});

describe('lock and amend', () => {
  it('locks, refuses changes, amends to the next version, and keeps both', async () => {
    const { reviewer, biologist } = team.members;
    const { id } = await fieldReading();
    const { reading } = await decided(await settle(reviewer, id, [{ q: 0, r: 0, state: 'small' }]));
    expect(await decided(await lock(biologist, id))).toEqual({ reading, version: 1 });
    expect(await readReading(reviewer, reading)).toMatchObject({ lockedVersion: 1, observer: 'The biologist' });
    expect((await readReading(reviewer, id)).lockedVersion).toBe(1);
    expect(await problemOf(await settle(reviewer, id, [EGG]))).toEqual([409, 'locked']);
    expect(await problemOf(await settle(reviewer, reading, [EGG]))).toEqual([409, 'locked']);
    expect(await problemOf(await lock(reviewer, reading))).toEqual([409, 'locked']);
    expect(await decided(await amend(biologist, reading, 'Another female, by a later photo.'))).toEqual({
      reading,
      version: 2,
    });
    expect((await readReading(reviewer, reading)).lockedVersion).toBe(1);
    expect(await problemOf(await amend(biologist, id))).toEqual([409, 'not-locked']);
    expect(await decided(await settle(reviewer, id, [{ q: 0, r: 0, state: 'capped' }]))).toEqual({
      reading,
      version: 2,
    });
    expect(await decided(await lock(reviewer, id))).toEqual({ reading, version: 2 });
    expect(await readReading(reviewer, reading)).toMatchObject({
      lockedVersion: 2,
      observer: 'The reviewer',
      marks: [{ state: 'capped' }, {}],
    });
    const review = await readingReview(await memberContext(team.teamId, reviewer.userId), id);
    expect(review.settlements.map(({ version, state }) => [version, state])).toEqual([
      [1, 'small'],
      [2, 'capped'],
    ]);
    expect(review.amendments).toMatchObject([
      { version: 2, reason: 'Another female, by a later photo.', actor: 'The biologist' },
    ]);
  });

  it('locks a reading that needed no correction', async () => {
    const { id } = await fieldReading();
    const { reading, version } = await decided(await lock(team.members.reviewer, id));
    expect(version).toBe(1);
    expect(await readReading(team.members.reviewer, reading)).toMatchObject({
      kind: 'final',
      lockedVersion: 1,
      tally: { cellsTotal: 2 },
    });
  });

  it('amends nothing that was never locked', async () => {
    const { id } = await fieldReading();
    expect(await problemOf(await amend(team.members.biologist, id))).toEqual([409, 'not-locked']);
    await settle(team.members.reviewer, id, [EGG]);
    expect(await problemOf(await amend(team.members.biologist, id))).toEqual([409, 'not-locked']);
  });

  it.each(['', ' ', 7, null, 'x'.repeat(10_001)])('asks for a reason to amend, in words: not %j', async (reason) => {
    const { id } = await fieldReading();
    await lock(team.members.reviewer, id);
    expect(await problemOf(await amend(team.members.reviewer, id, reason))).toEqual([400, 'shape']);
  });

  it('is for reviewers and lead biologists only', async () => {
    const { id } = await fieldReading();
    for (const role of ['technician', 'coordinator', 'researcher'] as const) {
      const as = team.members[role];
      for (const response of [await settle(as, id, [EGG]), await lock(as, id), await amend(as, id)]) {
        expect(await problemOf(response)).toEqual([403, 'role']);
      }
    }
  });

  it('takes one of three people who decide at the same moment, and tells the others', async () => {
    const { id } = await fieldReading();
    const cells = (state: string) => [{ q: 0, r: 0, state }];
    const answers = await Promise.all([
      settle(team.members.reviewer, id, cells('small')),
      settle(team.members.biologist, id, cells('medium')),
      settle(team.members.reviewer2, id, cells('large')),
    ]);
    expect(answers.map(({ status }) => status).sort((a, b) => a - b)).toEqual([200, 409, 409]);
    const refused = await Promise.all(answers.filter(({ status }) => status === 409).map(problemOf));
    expect(refused).toEqual([
      [409, 'settled-meanwhile'],
      [409, 'settled-meanwhile'],
    ]);
    const review = await readingReview(await memberContext(team.teamId, team.members.reviewer.userId), id);
    expect(review.settlements).toHaveLength(1);
  });
});

describe('audit chain', () => {
  it('holds every decision once, each entry sealed by the one before', async () => {
    const own = await makeTeam({ name: 'Audited' });
    const place = await makeNest(own);
    const id = await makeReading(own, { nest: place, visit: await makeVisit(own, place), marks: [EGG] });
    const { reading } = await decided(await settle(own.members.reviewer, id, [{ q: 0, r: 0, state: 'small' }]));
    await lock(own.members.reviewer, id);
    await problemOf(await lock(own.members.reviewer, id));
    await amend(own.members.biologist, id, 'Why not.');
    const rows = await database().models.AuditEntry.findAll({
      where: { team_id: toBinary(own.teamId) },
      order: ['seq'],
      raw: true,
    });
    expect(
      rows.map(({ seq, action, subject_id, actor_id }) => [
        seq,
        action,
        fromBinaryOrNull(subject_id),
        fromBinaryOrNull(actor_id),
      ]),
    ).toEqual([
      [1, 'reading.settle', reading, own.members.reviewer.userId],
      [2, 'reading.lock', reading, own.members.reviewer.userId],
      [3, 'reading.amend', reading, own.members.biologist.userId],
    ]);
    let previous = Buffer.alloc(32);
    for (const row of rows) {
      const { seq, at, action, detail } = row;
      const link = {
        teamId: fromBinary(row.team_id),
        seq,
        at,
        actorId: fromBinaryOrNull(row.actor_id),
        action,
        subjectId: fromBinaryOrNull(row.subject_id),
        detail,
      };
      expect(row.hash.equals(auditHash(previous, link))).toBe(true);
      previous = Buffer.from(row.hash);
    }
    const counter = await database().models.TeamCounter.findOne({
      where: { team_id: toBinary(own.teamId) },
      raw: true,
    });
    expect(counter).toMatchObject({ audit_seq: 3, seq: 1 });
    expect(counter?.audit_hash.equals(previous)).toBe(true);
  });
});

function cell(more: Record<string, unknown>): Record<string, unknown> {
  return { ...EGG, reason: 'x', ...more };
}
