import { beforeAll, describe, expect, it } from 'vitest';
import * as readingRoute from '@/app/api/readings/[id]/route';
import { decided, lock, readReading, settle } from '@/tests/support/api/decide';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeMarks, makeReading, makeRetraction } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { N12, n12Counts, n12Marks } from '@/tests/support/n12';

let team: TestTeam;
let nest: string;

beforeAll(async () => {
  team = await makeTeam();
  nest = await makeNest(team, { code: 'N12' });
});

describe('GET /api/readings/<id>', () => {
  it('shows the live marks in walk order with everything that was recorded about them', async () => {
    const visit = await makeVisit(team, nest);
    const id = await makeReading(team, { nest, visit, submittedAt: null });
    const [second = '', first = ''] = await makeMarks(team, id, [
      { q: 0, r: -1, state: 'large', instar: 5, unsure: true, scrap: true, note: 'face at the mouth' },
      { q: 0, r: 0, state: 'egg', nectar: true, reused: true },
    ]);
    expect(await readReading(team.members.technician, id)).toEqual({
      id,
      nest,
      visit,
      kind: 'field',
      source: 'phone',
      observer: 'The technician',
      openedAt: '2026-06-16T05:40:00.000-04:00',
      submittedAt: null,
      marks: [
        {
          cell: 0,
          q: 0,
          r: 0,
          state: 'egg',
          instar: null,
          nectar: true,
          unsure: false,
          reused: true,
          scrap: false,
          note: null,
          opId: first,
          at: '2026-06-16T05:41:07.120-04:00',
        },
        {
          cell: 1,
          q: 0,
          r: -1,
          state: 'large',
          instar: 5,
          nectar: false,
          unsure: true,
          reused: false,
          scrap: true,
          note: 'face at the mouth',
          opId: second,
          at: '2026-06-16T05:41:07.120-04:00',
        },
      ],
      tally: { ...n12Counts({ egg: 1, large: 1 }), cellsTotal: 2, nectarCells: 1 },
      lockedVersion: null,
    });
  });

  it('revives what a retracted mark had replaced', async () => {
    const id = await makeReading(team, { nest, visit: await makeVisit(team, nest) });
    const [egg = ''] = await makeMarks(team, id, [{ q: 0, r: 0, state: 'egg' }]);
    const [small = ''] = await makeMarks(team, id, [{ q: 0, r: 0, state: 'small', supersedes: egg }]);
    expect((await readReading(team.members.technician, id)).marks).toMatchObject([{ state: 'small', opId: small }]);
    await makeRetraction(team, id, small);
    expect((await readReading(team.members.technician, id)).marks).toMatchObject([{ state: 'egg', opId: egg }]);
  });

  it('counts N12 as it was counted by hand: field c6 p1 l6 m4 s6 e9 empty1, blind c7 l7 m4 s5 e10', async () => {
    const visit = await makeVisit(team, nest);
    const field = await makeReading(team, { nest, visit, marks: n12Marks('field') });
    const blind = await makeReading(team, { nest, visit, kind: 'second', marks: n12Marks('blind') });
    const tally = async (id: string) => (await readReading(team.members.biologist, id)).tally;
    const byHand = { capped: 6, parasitised: 1, large: 6, medium: 4, small: 6, egg: 9, empty: 1 };
    expect(await tally(field)).toEqual({ ...n12Counts(byHand), cellsTotal: 33, nectarCells: 0 });
    const blindByHand = n12Counts({ capped: 7, large: 7, medium: 4, small: 5, egg: 10 });
    expect(await tally(blind)).toEqual({ ...blindByHand, cellsTotal: 33, nectarCells: 0 });
    expect((await readReading(team.members.biologist, field)).marks.map((mark) => mark.cell)).toEqual(
      N12.map(({ cell }) => cell),
    );
  });

  it('settles N12 to the final reading counted by hand: c6 p1 l7 m3 s6 e10', async () => {
    const field = await makeReading(team, { nest, visit: await makeVisit(team, nest), marks: n12Marks('field') });
    const changed = N12.filter((cell) => cell.field !== cell.final).map(({ q, r, final: state }) => ({ q, r, state }));
    expect(changed).toHaveLength(2);
    const { reading } = await decided(await settle(team.members.biologist, field, changed));
    const byHand = n12Counts({ capped: 6, parasitised: 1, large: 7, medium: 3, small: 6, egg: 10 });
    expect((await readReading(team.members.biologist, reading)).tally).toEqual({
      ...byHand,
      cellsTotal: 33,
      nectarCells: 0,
    });
  });

  it.each(['not-an-id', '00000000-0000-7000-8000-000000000000', 'ABCDEF00-0000-7000-8000-000000000000'])(
    'answers 404 to %s',
    async (id) => {
      const response = await callApi(readingRoute, 'GET', { as: team.members.technician, params: { id } });
      expect(await problemOf(response)).toEqual([404, 'not-found']);
    },
  );

  it('takes no query', async () => {
    const response = await callApi(readingRoute, 'GET', {
      as: team.members.technician,
      params: { id: nest },
      query: 'upTo=1',
    });
    expect(await problemOf(response)).toEqual([400, 'param']);
  });
});

describe('a blind second reader', () => {
  it('sees nothing of what others read at the visit before submitting, and all of it afterwards', async () => {
    const { reviewer, reviewer2 } = team.members;
    const visit = await makeVisit(team, nest);
    const field = await makeReading(team, { nest, visit, marks: n12Marks('field') });
    // Locked by the reader's own hand, so that it even stands under their name.
    const { reading: final } = await decided(await lock(reviewer, field));
    const own = await makeReading(team, {
      nest,
      visit,
      kind: 'second',
      submittedAt: null,
      marks: [{ q: 0, r: 0, state: 'egg' }],
    });
    for (const hidden of [field, final]) {
      const response = await callApi(readingRoute, 'GET', { as: reviewer, params: { id: hidden } });
      const text = await response.text();
      expect(response.status).toBe(403);
      expect(text).toContain('"code":"blind"');
      expect(text).not.toContain('parasitised');
    }
    expect((await readReading(reviewer, own)).tally.cellsTotal).toBe(1);
    expect((await readReading(reviewer2, field)).tally.cellsTotal).toBe(33);
    const elsewhere = await makeReading(team, { nest, visit: await makeVisit(team, nest), marks: n12Marks('field') });
    expect((await readReading(reviewer, elsewhere)).tally.cellsTotal).toBe(33);
    await submit(own);
    expect((await readReading(reviewer, field)).tally.cellsTotal).toBe(33);
  });

  it('may not settle, lock or amend either, which would show the reading by its answer', async () => {
    const visit = await makeVisit(team, nest);
    const field = await makeReading(team, { nest, visit, marks: n12Marks('field') });
    await makeReading(team, { nest, visit, kind: 'second', submittedAt: null });
    const cells = [{ q: 0, r: 0, state: 'egg' }];
    expect(await problemOf(await settle(team.members.reviewer, field, cells))).toEqual([403, 'blind']);
    expect(await problemOf(await lock(team.members.reviewer, field))).toEqual([403, 'blind']);
    expect((await readReading(team.members.biologist, field)).lockedVersion).toBeNull();
  });
});

async function submit(id: string): Promise<void> {
  const { database } = await import('@/lib/server/db/database');
  const { toBinary } = await import('@/lib/server/db/uuid-binary');
  await database().models.Reading.update(
    { submitted_at: new Date('2026-06-17T09:00:00Z') },
    { where: { team_id: toBinary(team.teamId), id: toBinary(id) } },
  );
}
