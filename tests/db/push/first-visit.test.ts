import { beforeAll, describe, expect, it } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { RECEIVED_MS, pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;
const ids = freshIds();
let ops: Op[] = [];

beforeAll(async () => {
  team = await makeTeam();
  const opening = openingOps(ids, 'N12');
  const mark = markOp(ids, { q: 0, r: 0, state: 'egg', nectar: true, note: 'wet' });
  ops = [
    ...opening,
    mark,
    markOp(ids, { q: 0, r: -1, state: 'small', instar: 2, supersedes: mark.opId }),
    wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } }),
    wireOp({ kind: 'reading.submit', ...ids, body: {} }),
  ];
});

const inTeam = () => ({ team_id: toBinary(team.teamId) });

describe('a first visit', () => {
  it('is applied whole, each operation at the next place of the log', async () => {
    const results = await pushAs(team, team.members.technician, ops);
    expect(results).toEqual(
      ops.map((op, index) => ({ opId: op.opId, r: 'applied', seq: index + 1, bodyHash: op.bodyHash })),
    );
  });

  it('stands in the log as it came, with who sent it and when', async () => {
    const rows = await database().models.Op.findAll({ where: inTeam(), order: ['seq'] });
    expect(rows.map((row) => JSON.parse(row.op) as Op)).toEqual(ops);
    expect(rows.map((row) => fromBinary(row.actor_id))).toEqual(ops.map(() => team.members.technician.userId));
    expect(rows.map((row) => row.received_at.getTime())).toEqual(ops.map(() => RECEIVED_MS));
    expect(rows.map((row) => row.flags)).toEqual(ops.map(() => ''));
  });

  it('fills nest, visit and reading', async () => {
    const { Nest, Visit, Reading } = database().models;
    const nest = await Nest.findOne({ where: inTeam(), rejectOnEmpty: true });
    expect(nest).toMatchObject({
      code: 'N12',
      name: 'N12 roof',
      taxon: 'Polistes fuscatus',
      lat: null,
      archived_at: null,
    });
    expect(nest.opened_at).toEqual(new Date('2026-06-16T05:41:07.120-04:00'));
    const visit = await Visit.findOne({ where: inTeam(), rejectOnEmpty: true });
    expect(visit).toMatchObject({ purpose: 'take-down', started_at: new Date('2026-06-16T05:35:00-04:00') });
    const reading = await Reading.findOne({ where: inTeam(), rejectOnEmpty: true });
    expect(reading).toMatchObject({ kind: 'field', source: 'phone', based_on: null });
    expect(reading.submitted_at).toEqual(new Date('2026-06-16T05:41:07.120-04:00'));
    expect(fromBinary(reading.nest_id)).toBe(ids.nest);
  });

  it('keeps marks and what took them back', async () => {
    const { Mark, Retraction } = database().models;
    const marks = await Mark.findAll({ where: inTeam(), order: ['seq'] });
    expect(
      marks.map(({ q, r, state, nectar, instar, note }) => ({ q, r, state, nectar: Boolean(nectar), instar, note })),
    ).toEqual([
      { q: 0, r: 0, state: 'egg', nectar: true, instar: null, note: 'wet' },
      { q: 0, r: -1, state: 'small', nectar: false, instar: 2, note: null },
    ]);
    const retraction = await Retraction.findOne({ where: inTeam(), rejectOnEmpty: true });
    expect(fromBinary(retraction.target)).toBe(ops[3]?.opId);
  });

  it('sent again, in any order, from anyone, has no second effect', async () => {
    const again = await pushAs(team, team.members.technician2, [...ops].reverse());
    expect(wordsOf(again)).toEqual(ops.map(() => 'duplicate'));
    expect(again.map(({ seq }) => seq)).toEqual([7, 6, 5, 4, 3, 2, 1]);
    expect(await database().models.Op.count({ where: inTeam() })).toBe(7);
    expect(await database().models.QuarantinedOp.count({ where: inTeam() })).toBe(0);
    expect(await database().models.AuditEntry.count({ where: inTeam() })).toBe(1);
  });

  it('may arrive back to front within a batch: dependencies are found', async () => {
    const other = freshIds();
    const [nest, visit, reading] = openingOps(other, 'N13');
    const mark = markOp(other, { q: 1, r: 0, state: 'capped' });
    const shuffled = [mark, reading, visit, nest].map((op, index) => ({ ...op, n: index }) as Op);
    expect(wordsOf(await pushAs(team, team.members.technician, shuffled))).toEqual(Array(4).fill('applied'));
  });
});
