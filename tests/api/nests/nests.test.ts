import { beforeAll, describe, expect, it } from 'vitest';
import * as nestRoute from '@/app/api/nests/[id]/route';
import * as nestsRoute from '@/app/api/nests/route';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { memberContext } from '@/lib/server/auth/member-context';
import type { NestAnswer, NestList } from '@/lib/server/presenters/present-nest';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeMarks, makeReading, makeRetraction } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;

async function list(query = '', as = team.members.technician): Promise<NestList> {
  const response = await callApi(nestsRoute, 'GET', { as, query });
  expect(response.status).toBe(200);
  return (await response.json()) as NestList;
}

const codes = async (query: string) => (await list(query)).nests.map((nest) => nest.code);

async function detail(id: string, as = team.members.technician): Promise<NestAnswer> {
  const response = await callApi(nestRoute, 'GET', { as, params: { id } });
  expect(response.status).toBe(200);
  return (await response.json()) as NestAnswer;
}

/** Three nests: N01 with two visits and a locked reading, N02 with an open one, N03 with nothing. */
const ids = { n01: '', n02: '', n03: '', early: '', late: '', reading: '' };

beforeAll(async () => {
  team = await makeTeam();
  ids.n01 = await makeNest(team, {
    code: 'N01',
    name: 'Boat house, 100% shade',
    openedAt: '2026-05-18T09:00:00.000-04:00',
  });
  ids.n02 = await makeNest(team, {
    code: 'N02',
    name: 'bike_shed',
    taxon: 'Polistes metricus',
    place: { lat: 43.5785, lon: -77.5985, accuracyM: 4 },
    openedAt: '2026-05-26T09:00:00.000-04:00',
  });
  ids.n03 = await makeNest(team, { code: 'N03', name: null, taxon: null, openedAt: '2026-05-30T09:00:00.000-04:00' });
  ids.early = await makeVisit(team, ids.n01, { startedAt: '2026-05-21T07:10:00.000-04:00' });
  ids.late = await makeVisit(team, ids.n01, { purpose: 'check', startedAt: '2026-05-31T23:30:00.000-04:00' });
  ids.reading = await makeReading(team, {
    nest: ids.n01,
    visit: ids.early,
    openedAt: '2026-05-21T07:15:00.000-04:00',
    marks: [
      { q: 0, r: 0, state: 'egg', nectar: true },
      { q: 0, r: -1, state: 'small' },
      { q: 1, r: -1, state: 'unread' },
    ],
  });
  const visit = await makeVisit(team, ids.n02, { startedAt: '2026-05-29T06:05:00.000-04:00' });
  const open = await makeReading(team, { nest: ids.n02, visit, submittedAt: null });
  const [first = '', second = ''] = await makeMarks(team, open, [
    { q: 0, r: 0, state: 'egg' },
    { q: 0, r: -1, state: 'egg' },
  ]);
  await makeMarks(team, open, [{ q: 0, r: 0, state: 'small', supersedes: first }]);
  await makeRetraction(team, open, second);
  await lockReading(
    await memberContext(team.teamId, team.members.biologist.userId),
    { id: ids.reading },
    Date.parse('2026-06-01T12:00:00Z'),
  );
});

describe('GET /api/nests', () => {
  it('lists the nests of the team by code, with what the last visits found', async () => {
    expect(await list()).toEqual({
      nests: [
        {
          id: ids.n01,
          code: 'N01',
          name: 'Boat house, 100% shade',
          taxon: 'Polistes fuscatus',
          openedAt: '2026-05-18T09:00:00.000-04:00',
          visits: 2,
          lastVisitAt: '2026-05-31T23:30:00.000-04:00',
          cells: 3,
          state: 'locked',
        },
        {
          id: ids.n02,
          code: 'N02',
          name: 'bike_shed',
          taxon: 'Polistes metricus',
          openedAt: '2026-05-26T09:00:00.000-04:00',
          visits: 1,
          lastVisitAt: '2026-05-29T06:05:00.000-04:00',
          cells: 1,
          state: 'reading',
        },
        {
          id: ids.n03,
          code: 'N03',
          name: null,
          taxon: null,
          openedAt: '2026-05-30T09:00:00.000-04:00',
          visits: 0,
          lastVisitAt: null,
          cells: null,
          state: 'new',
        },
      ],
      total: 3,
      page: 1,
      pages: 1,
    });
  });

  it.each([
    ['q=boat', ['N01']],
    ['q=n0', ['N01', 'N02', 'N03']],
    ['q=METRICUS', ['N02']],
    ['q=%25', ['N01']],
    ['q=_', ['N02']],
    ['q=0%25', ['N01']],
    ['q=!', []],
    ['q=%5C', []],
    ["q=' OR 1=1--", []],
    ['q="; DROP TABLE nests', []],
    ['taxon=Polistes metricus', ['N02']],
    ['taxon=Polistes%', []],
    ['taxon=Polistes metricus ', []],
    ['from=2026-05-29&to=2026-05-29', ['N02']],
    ['from=2026-05-30', ['N01']],
    ['from=2026-05-31&to=2026-05-31', ['N01']],
    ['from=2026-06-01', []],
    ['to=2026-05-21', ['N01']],
    ['to=2026-05-20', []],
    ['q=&taxon=&from=&to=&sort=&page=', ['N01', 'N02', 'N03']],
  ])('takes %s as %j', async (query, expected) => {
    expect(await codes(query.replaceAll(' ', '%20'))).toEqual(expected);
  });

  it.each([
    ['code', ['N01', 'N02', 'N03']],
    ['-code', ['N03', 'N02', 'N01']],
    ['name', ['N03', 'N02', 'N01']],
    ['taxon', ['N03', 'N01', 'N02']],
    ['-openedAt', ['N03', 'N02', 'N01']],
    ['lastVisitAt', ['N03', 'N02', 'N01']],
    ['visits', ['N03', 'N02', 'N01']],
    ['cells', ['N03', 'N02', 'N01']],
    ['-cells', ['N01', 'N02', 'N03']],
  ])('sorts by %s', async (sort, expected) => {
    expect(await codes(`sort=${sort}`)).toEqual(expected);
  });

  it.each([
    ['sort=password', 'param'],
    ['sort=constructor', 'param'],
    ['sort=--code', 'param'],
    ['sort=code%20DESC', 'param'],
    ['sort=code,name', 'param'],
    ['page=0', 'param'],
    ['page=-1', 'param'],
    ['page=1.5', 'param'],
    ['page=all', 'param'],
    ['page=99999999', 'param'],
    ['from=2026-13-40', 'param'],
    ['from=2026-02-30', 'param'],
    ['to=0001-01-01', 'param'],
    ['to=16.06.2026', 'param'],
    ['q[]=a&q[]=b', 'param'],
    ['id=1', 'param'],
    ['q=a&q=b', 'dup-param'],
    ['page=1&page=1', 'dup-param'],
  ])('answers 400 to ?%s', async (query, code) => {
    const response = await callApi(nestsRoute, 'GET', { as: team.members.technician, query });
    expect(await problemOf(response)).toEqual([400, code]);
  });

  it('answers 400 to a search longer than 200 characters, counted in code points', async () => {
    expect((await list(`q=${encodeURIComponent('é'.repeat(200))}`)).total).toBe(0);
    const response = await callApi(nestsRoute, 'GET', { as: team.members.technician, query: `q=${'x'.repeat(201)}` });
    expect(await problemOf(response)).toEqual([400, 'param']);
  });

  it('cuts the list into pages of 25, with nothing lost or shown twice', async () => {
    const big = await makeTeam({ name: 'A large programme' });
    for (let i = 0; i < 53; i++) await makeNest(big, { code: `M${String(i % 7)}`, name: `nest ${i}` });
    const pages = await Promise.all([1, 2, 3, 4].map((page) => list(`page=${page}&sort=-code`, big.members.reviewer)));
    expect(pages.map(({ nests, total, pages: count }) => [nests.length, total, count])).toEqual([
      [25, 53, 3],
      [25, 53, 3],
      [3, 53, 3],
      [0, 53, 3],
    ]);
    expect(new Set(pages.flatMap(({ nests }) => nests.map((nest) => nest.id))).size).toBe(53);
    const byCells = await list('page=2&sort=cells', big.members.reviewer);
    expect(byCells.nests).toHaveLength(25);
  });

  it('keeps an archived nest in the list and says so, and leaves archived visits out of its figures', async () => {
    const other = await makeTeam({ name: 'Archivists' });
    const nest = await makeNest(other, { code: 'OLD', archivedAt: '2026-10-01T00:00:00Z' });
    await makeVisit(other, nest, { startedAt: '2026-05-21T07:10:00.000-04:00' });
    await makeVisit(other, nest, { startedAt: '2026-05-22T07:10:00.000-04:00', archivedAt: '2026-05-23T00:00:00Z' });
    const [row] = (await list('', other.members.technician)).nests;
    expect(row).toMatchObject({ state: 'archived', visits: 1, lastVisitAt: '2026-05-21T07:10:00.000-04:00' });
  });
});

describe('GET /api/nests/<id>', () => {
  it('shows a nest with its visits, readings and tallies in order', async () => {
    const nest = await detail(ids.n01);
    expect(nest).toMatchObject({
      id: ids.n01,
      code: 'N01',
      name: 'Boat house, 100% shade',
      taxon: 'Polistes fuscatus',
      place: null,
    });
    expect(nest.visits.map(({ id, purpose, startedAt }) => [id, purpose, startedAt])).toEqual([
      [ids.early, 'take-down', '2026-05-21T07:10:00.000-04:00'],
      [ids.late, 'check', '2026-05-31T23:30:00.000-04:00'],
    ]);
    const [field, final] = nest.visits[0]?.readings ?? [];
    expect(field).toEqual({
      id: ids.reading,
      kind: 'field',
      observer: 'The technician',
      openedAt: '2026-05-21T07:15:00.000-04:00',
      submittedAt: '2026-06-16T10:00:00.000Z',
      lockedVersion: 1,
      tally: {
        cellsTotal: 3,
        empty: 0,
        egg: 1,
        small: 1,
        medium: 0,
        large: 0,
        capped: 0,
        opened: 0,
        dead: 0,
        parasitised: 0,
        webbed: 0,
        damaged: 0,
        unread: 1,
        nectarCells: 1,
      },
    });
    expect(final).toMatchObject({
      kind: 'final',
      observer: 'The biologist',
      lockedVersion: 1,
      tally: { cellsTotal: 3 },
    });
  });

  it('shows everybody but a researcher the exact place', async () => {
    const exact = { lat: 43.5785, lon: -77.5985, accuracyM: 4 };
    expect((await detail(ids.n02, team.members.coordinator)).place).toEqual(exact);
    expect((await detail(ids.n02, team.members.researcher)).place).toEqual({ lat: 43.57, lon: -77.6, accuracyM: null });
  });

  it.each(['not-an-id', '00000000-0000-7000-8000-000000000000', 'CAFE', '../nests', "' OR 1=1--"])(
    'answers 404 to %s',
    async (id) => {
      const response = await callApi(nestRoute, 'GET', { as: team.members.technician, params: { id } });
      expect(await problemOf(response)).toEqual([404, 'not-found']);
    },
  );

  it('asks who is there before anything else', async () => {
    expect(await problemOf(await callApi(nestRoute, 'GET', { params: { id: ids.n01 } }))).toEqual([401, 'signin']);
    expect(await problemOf(await callApi(nestsRoute, 'GET', { query: 'sort=password' }))).toEqual([401, 'signin']);
  });

  it('takes no other method than GET and HEAD', async () => {
    const response = await callApi(nestRoute, 'PUT', { as: team.members.biologist, params: { id: ids.n01 }, body: {} });
    expect([response.status, response.headers.get('allow')]).toEqual([405, 'GET, HEAD']);
  });
});
