import { beforeAll, describe, expect, it } from 'vitest';
import { accept, choose, claim, queue, queued, release } from '@/tests/support/api/review';
import { amend, lock, readReading, settle } from '@/tests/support/api/decide';
import { problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeMarks, makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Marks } from '@/tests/support/n12';

let team: TestTeam;
let nest: string;
const EGG = { q: 0, r: 0, state: 'egg' } as const;

beforeAll(async () => {
  team = await makeTeam();
  nest = await makeNest(team);
});

async function handedIn(submittedAt = '2026-06-16T10:00:00Z'): Promise<{ visit: string; field: string }> {
  const visit = await makeVisit(team, nest);
  return { visit, field: await makeReading(team, { nest, visit, submittedAt, marks: [EGG] }) };
}

describe('the queue', () => {
  it('lists what was handed in, oldest first, and says who waits for what', async () => {
    const late = await handedIn('2026-06-18T10:00:00Z');
    const early = await handedIn('2026-06-15T10:00:00Z');
    const { waiting } = await queue(team.members.reviewer);
    const places = [early, late].map(({ visit }) => waiting.findIndex((item) => item.visit === visit));
    expect(places[0]).toBeLessThan(places[1] ?? -1);
    expect(waiting[places[0] ?? 0]).toMatchObject({ waitsFor: 'second', reader: null, mine: false, overdue: true });
  });

  it('leaves out what is still being read in the field, and what is locked', async () => {
    const open = await makeVisit(team, nest);
    await makeReading(team, { nest, visit: open, submittedAt: null, marks: [EGG] });
    const locked = await handedIn();
    await lock(team.members.reviewer, locked.field);
    expect(await queued(team.members.reviewer, open)).toBeUndefined();
    expect(await queued(team.members.reviewer, locked.visit)).toBeUndefined();
  });

  it('shows a lock as overtaken when the field marks something later, and changes nothing', async () => {
    const { visit, field } = await handedIn();
    await lock(team.members.reviewer, field);
    await makeMarks(team, field, [{ q: 1, r: 0, state: 'small' }]);
    expect(await queued(team.members.reviewer, visit)).toMatchObject({ waitsFor: 'later-marks' });
    await amend(team.members.reviewer, field);
    expect(await queued(team.members.reviewer, visit)).toMatchObject({ waitsFor: 'lock' });
  });

  it('counts what each reader has in hand and has done', async () => {
    const { visit } = await handedIn();
    const countsOf = async () =>
      (await queue(team.members.biologist)).readers.find(({ name }) => name === team.members.reviewer2.name);
    const before = await countsOf();
    await claim(team.members.reviewer2, visit);
    expect((await countsOf())?.reading).toBe((before?.reading ?? 0) + 1);
    await makeReading(team, { nest, visit, kind: 'second', by: team.members.reviewer2.userId, marks: [EGG] });
    expect(await countsOf()).toMatchObject({ reading: before?.reading, read: (before?.read ?? 0) + 1 });
  });
});

describe('taking on a second reading', () => {
  it('is won by one of several who try at the same moment; the others get one clear code', async () => {
    const { visit } = await handedIn();
    const { reviewer, reviewer2, biologist } = team.members;
    const answers = await Promise.all([reviewer, reviewer2, biologist].map((as) => claim(as, visit)));
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    for (const answer of answers.filter(({ status }) => status !== 200)) {
      expect(await problemOf(answer)).toEqual([409, 'claimed']);
    }
    expect(await queued(reviewer, visit)).toMatchObject({ waitsFor: 'reading' });
  });

  it('can be given back, by oneself or by the lead biologist', async () => {
    const { visit } = await handedIn();
    const { reviewer, reviewer2, biologist } = team.members;
    await claim(reviewer, visit);
    expect(await problemOf(await release(reviewer2, visit))).toEqual([409, 'not-claimed']);
    expect((await release(reviewer, visit)).status).toBe(200);
    expect((await claim(reviewer2, visit)).status).toBe(200);
    expect((await release(biologist, visit)).status).toBe(200);
    expect(await queued(reviewer, visit)).toMatchObject({ waitsFor: 'second', reader: null });
  });

  it('is refused to the person who read it in the field, and where nothing waits', async () => {
    const { reviewer, biologist } = team.members;
    const visit = await makeVisit(team, nest);
    await makeReading(team, { nest, visit, by: reviewer.userId, marks: [EGG] });
    expect(await problemOf(await claim(reviewer, visit))).toEqual([409, 'own-reading']);
    await makeReading(team, { nest, visit, kind: 'second', by: biologist.userId, marks: [EGG] });
    expect(await problemOf(await claim(biologist, visit))).toEqual([409, 'not-waiting']);
    expect(await problemOf(await claim(biologist, await makeVisit(team, nest)))).toEqual([409, 'not-waiting']);
  });
});

describe('two readings of one comb', () => {
  async function both(field: Parameters<typeof makeReading>[1]['marks'], lab: typeof field) {
    const visit = await makeVisit(team, nest);
    const id = await makeReading(team, { nest, visit, marks: field });
    await makeReading(team, { nest, visit, kind: 'second', marks: lab });
    return { visit, id };
  }

  // N12: 29 of 33 alike, 0.8788, and a clash over a parasitised cell (the programme's worked reading).
  it('of N12 go to the lead biologist: a reviewer may neither settle nor lock', async () => {
    const { visit, id } = await both(n12Marks('field'), n12Marks('blind'));
    const { reviewer, biologist } = team.members;
    expect(await queued(reviewer, visit)).toMatchObject({ waitsFor: 'lead' });
    const cells = [{ q: -1, r: 0, state: 'parasitised', pick: 'field' }];
    expect(await problemOf(await settle(reviewer, id, cells))).toEqual([403, 'lead-settles']);
    expect(await problemOf(await lock(reviewer, id))).toEqual([403, 'lead-settles']);
    expect(await problemOf(await accept(reviewer, id))).toEqual([403, 'lead-settles']);
    expect((await accept(biologist, id)).status).toBe(200);
    expect((await settle(biologist, id, cells)).status).toBe(200);
    expect(await problemOf(await lock(biologist, id))).toEqual([409, 'unsettled']);
    const rest = [
      { q: 0, r: 2, state: 'large', pick: 'lab' },
      { q: -2, r: 0, state: 'small', pick: 'field' },
      { q: -3, r: 2, state: 'unread', pick: 'unsure' },
    ];
    expect((await settle(biologist, id, rest)).status).toBe(200);
    expect(await queued(reviewer, visit)).toMatchObject({ waitsFor: 'lock' });
    expect((await lock(biologist, id)).status).toBe(200);
  });

  it('that agree well enough are settled by a reviewer alone, who says whose view is taken', async () => {
    const ten = Array.from({ length: 10 }, (_, q) => ({ q, r: 0, state: 'egg' as const }));
    const { visit, id } = await both(ten, [...ten.slice(1), { q: 0, r: 0, state: 'empty' }]);
    const { reviewer } = team.members;
    expect(await queued(reviewer, visit)).toMatchObject({ waitsFor: 'reviewer' });
    const wrong = [{ q: 0, r: 0, state: 'capped', pick: 'lab' }];
    expect(await problemOf(await settle(reviewer, id, wrong))).toEqual([409, 'pick']);
    expect(await problemOf(await lock(reviewer, id))).toEqual([409, 'unsettled']);
    expect((await settle(reviewer, id, [{ q: 0, r: 0, state: 'empty', pick: 'lab' }])).status).toBe(200);
    expect((await lock(reviewer, id)).status).toBe(200);
  });

  it('leave a cell out of the final reading when it was decided not to be there', async () => {
    const ten = Array.from({ length: 10 }, (_, q) => ({ q, r: 0, state: 'egg' as const }));
    const { id } = await both([...ten, { q: 0, r: 1, state: 'egg' }], ten);
    const { reviewer } = team.members;
    expect(await problemOf(await lock(reviewer, id))).toEqual([409, 'unsettled']);
    await settle(reviewer, id, [{ q: 0, r: 1, state: 'unread', pick: 'none' }]);
    const { reading } = (await (await lock(reviewer, id)).json()) as { reading: string };
    expect((await readReading(reviewer, reading)).tally).toMatchObject({ cellsTotal: 10, egg: 10 });
  });
});

describe('two field readings of one visit', () => {
  it('are both kept; the chosen one counts, and only it can be settled', async () => {
    const visit = await makeVisit(team, nest);
    const first = await makeReading(team, { nest, visit, marks: [EGG] });
    const by = team.members.technician2.userId;
    const second = await makeReading(team, { nest, visit, by, marks: [{ ...EGG, state: 'small' }] });
    const { reviewer } = team.members;
    expect(await queued(reviewer, visit)).toMatchObject({ toChoose: 2 });
    expect((await choose(reviewer, visit, second)).status).toBe(200);
    expect(await queued(reviewer, visit)).toMatchObject({ toChoose: 0 });
    expect(await problemOf(await settle(reviewer, first, [EGG]))).toEqual([409, 'not-primary']);
    expect((await lock(reviewer, second)).status).toBe(200);
    expect(await problemOf(await choose(reviewer, visit, first))).toEqual([409, 'locked']);
  });

  it('cannot be chosen by somebody who still has to read the comb', async () => {
    const { visit, field } = await handedIn();
    await claim(team.members.reviewer, visit);
    expect(await problemOf(await choose(team.members.reviewer, visit, field))).toEqual([403, 'blind']);
  });
});
