import { beforeAll, describe, expect, it } from 'vitest';
import * as samplesRoute from '@/app/api/samples/route';
import { memberContext } from '@/lib/server/auth/member-context';
import { checkTeams } from '@/lib/server/audit/check-teams';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { drawSamples } from '@/lib/server/commands/samples/draw-samples';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { rereadings } from '@/lib/server/queries/rereadings';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Marks } from '@/tests/support/n12';

const LOCKED_MS = Date.parse('2026-06-22T09:15:00-04:00');
const DRAWN_MS = Date.parse('2026-07-01T08:00:00-04:00');

let team: TestTeam;
let visits: { nest: string; visit: string }[];

const contextOf = (member: TestMember) => memberContext(team.teamId, member.userId);
const draw = (as: TestMember | null, body: unknown) => callApi(samplesRoute, 'POST', { as, body });

/** A nest read twice and locked in June. */
async function lockedNest(code: string) {
  const nest = await makeNest(team, { code });
  const visit = await makeVisit(team, nest);
  const marks = n12Marks('field').slice(0, 3);
  const id = await makeReading(team, { nest, visit, marks });
  await makeReading(team, { nest, visit, kind: 'second', marks, openedAt: '2026-06-18T10:00:00.000-04:00' });
  await lockReading(await contextOf(team.members.biologist), { id }, LOCKED_MS);
  return { nest, visit };
}

beforeAll(async () => {
  team = await makeTeam();
  visits = [];
  for (let at = 1; at <= 21; at += 1) visits.push(await lockedNest(`N${String(at).padStart(2, '0')}`));
});

describe('drawing readings to be read again', () => {
  it('takes 10 % for another reader and 5 % for the same, rounded up, once, and says so in the audit chain', async () => {
    const ctx = await contextOf(team.members.reviewer);
    const drawn = await drawSamples(ctx, '2026-06', DRAWN_MS);
    expect(drawn).toEqual({ month: '2026-06', otherReader: 3, sameReader: 2 });
    const stored = () =>
      database().models.ReadingSample.findAll({ where: { team_id: toBinary(team.teamId) }, order: ['id'], raw: true });
    const before = await stored();
    expect(await drawSamples(ctx, '2026-06', DRAWN_MS + 1000)).toEqual(drawn);
    expect(await stored()).toEqual(before);
    const entries = await database().models.AuditEntry.findAll({ where: { action: 'samples.draw' }, raw: true });
    expect(entries).toHaveLength(1);
    expect((await checkTeams([]))[0]?.faults).toEqual([]);
  });

  it('is refused for a month that is not over, and for what is no month', async () => {
    const ctx = await contextOf(team.members.reviewer);
    await expect(drawSamples(ctx, '2026-07', DRAWN_MS)).rejects.toMatchObject({ code: 'param' });
    for (const month of ['2026-13', '2026-6', 'June', 6]) {
      expect((await problemOf(await draw(team.members.reviewer, { month })))[0]).toBe(400);
    }
  });

  it('draws nothing for a month in which nothing was locked', async () => {
    const answer = await draw(team.members.biologist, { month: '2026-05' });
    expect(await answer.json()).toEqual({ month: '2026-05', otherReader: 0, sameReader: 0 });
  });

  it('is for those who settle', async () => {
    for (const member of [team.members.technician, team.members.coordinator, team.members.researcher]) {
      expect(await problemOf(await draw(member, { month: '2026-06' }))).toEqual([403, 'role']);
    }
    expect(await problemOf(await draw(null, { month: '2026-06' }))).toEqual([401, 'signin']);
  });
});

describe('what waits to be read again', () => {
  it('is done when somebody who counts has handed in a later lab reading', async () => {
    const ctx = await contextOf(team.members.reviewer);
    const { drawn } = await rereadings(ctx, DRAWN_MS);
    expect(drawn.every(({ standing }) => standing === 'waiting')).toBe(true);
    const standing = async (id: string) =>
      (await rereadings(ctx, DRAWN_MS)).drawn.find((sample) => sample.id === id)?.standing;
    const sameNests = new Set(drawn.filter(({ purpose }) => purpose === 'same-reader').map(({ nest }) => nest.id));
    const sample = drawn.find(({ purpose, nest }) => purpose === 'other-reader' && !sameNests.has(nest.id));
    const place = visits.find(({ nest }) => nest === sample?.nest.id);
    if (!sample || !place) throw new Error('a sample for another reader is needed');
    expect(sample.reader).toBe('The reviewer');
    const late = { ...place, kind: 'second', openedAt: '2026-07-03T10:00:00.000-04:00' } as const;
    await makeReading(team, { ...late, by: team.members.reviewer.userId });
    expect(await standing(sample.id)).toBe('waiting');
    const open = await makeReading(team, { ...late, by: team.members.reviewer2.userId, submittedAt: null });
    expect(await standing(sample.id)).toBe('under way');
    await database().models.Reading.update({ submitted_at: new Date(DRAWN_MS) }, { where: { id: toBinary(open) } });
    expect(await standing(sample.id)).toBe('done');
  });

  it('offers the months that are over, have locked readings and no draw', async () => {
    const other = await makeTeam();
    const ctx = await memberContext(other.teamId, other.members.reviewer.userId);
    expect((await rereadings(ctx, DRAWN_MS)).undrawnMonths).toEqual([]);
    expect((await rereadings(await contextOf(team.members.reviewer), DRAWN_MS)).undrawnMonths).toEqual([]);
  });
});
