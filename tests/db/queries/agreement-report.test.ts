import { beforeAll, describe, expect, it } from 'vitest';
import { memberContext } from '@/lib/server/auth/member-context';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { settleReading } from '@/lib/server/commands/readings/settle-reading';
import { agreementReport } from '@/lib/server/queries/agreement-report';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Decisions, n12Marks } from '@/tests/support/n12';

const NOW_MS = Date.parse('2026-12-01T12:00:00Z');
const DECIDED_MS = Date.parse('2026-06-22T09:15:00-04:00');

let team: TestTeam;
let visit: string;
let nest: string;

async function report(member: TestMember, year?: string) {
  return agreementReport(await memberContext(team.teamId, member.userId), year, NOW_MS);
}

beforeAll(async () => {
  team = await makeTeam();
  const { biologist, technician2 } = team.members;
  nest = await makeNest(team, { code: 'N12' });
  visit = await makeVisit(team, nest);
  const field = await makeReading(team, { nest, visit, marks: n12Marks('field') });
  await makeReading(team, { nest, visit, kind: 'second', marks: n12Marks('blind') });
  const ctx = await memberContext(team.teamId, biologist.userId);
  await settleReading(ctx, { id: field, cells: n12Decisions() }, DECIDED_MS);
  await lockReading(ctx, { id: field }, DECIDED_MS);
  const other = await makeNest(team, { code: 'N13' });
  const july = await makeVisit(team, other, { startedAt: '2026-07-31T23:30:00.000-04:00' });
  const theirs = { nest: other, visit: july, marks: n12Marks('field') };
  const id = await makeReading(team, { ...theirs, by: technician2.userId });
  await makeReading(team, { ...theirs, kind: 'second' });
  await lockReading(ctx, { id }, DECIDED_MS);
});

describe('the report on agreement', () => {
  it('pools each reader by local month: N12 is 29 of 33 in June', async () => {
    const { readers, year, years } = await report(team.members.reviewer);
    expect([year, years]).toEqual(['2026', ['2026']]);
    expect(
      readers.map(({ reader, comparison, points }) => [reader, comparison, points[0]?.month, points[0]?.agreed]),
    ).toEqual([
      ['Another technician', 'field-lab', '2026-07', 33],
      ['The technician', 'field-lab', '2026-06', 29],
    ]);
    const [point] = readers[1]?.points ?? [];
    expect([point?.n, point?.combs, point?.share.toFixed(4)]).toEqual([33, 1, '0.8788']);
  });

  it('gives each state the cells that either called so', async () => {
    const { states } = await report(team.members.biologist);
    const parasitised = states.find(({ state }) => state === 'parasitised');
    expect(parasitised?.points.map(({ month, n, agreed }) => [month, n, agreed])).toEqual([
      ['2026-06', 1, 0],
      ['2026-07', 1, 1],
    ]);
    expect(states.some(({ state }) => state === 'unread')).toBe(false);
  });

  it('shows a technician her own figures and notes and nobody else’s', async () => {
    const { readers, notes } = await report(team.members.technician);
    expect(readers.map(({ reader }) => reader)).toEqual(['The technician']);
    expect(notes.map(({ name, own, stood, cells }) => [name, own, stood, cells])).toEqual([
      ['The technician', true, 31, 33],
    ]);
    expect(notes[0]?.notes.map(({ words }) => words)).toEqual([
      expect.stringMatching(/^You read 1 of 7 large larvae as medium larva\./),
      expect.stringMatching(/^You read 1 of 10 eggs as empty\. Tilt the light/),
    ]);
  });

  it('shows notes of others to the lead biologist and not to a reviewer', async () => {
    expect((await report(team.members.reviewer)).notes).toEqual([]);
    expect((await report(team.members.biologist)).notes.map(({ name, own }) => [name, own])).toEqual([
      ['The technician', false],
      ['Another technician', false],
    ]);
  });

  it('leaves out a visit at which the person who asks has a second reading open', async () => {
    const { reviewer2 } = team.members;
    await makeReading(team, { nest, visit, kind: 'second', by: reviewer2.userId, submittedAt: null });
    expect((await report(reviewer2)).readers.map(({ reader }) => reader)).toEqual(['Another technician']);
  });

  it('falls back to the newest year for one without visits', async () => {
    expect((await report(team.members.reviewer, '1999')).year).toBe('2026');
  });
});
