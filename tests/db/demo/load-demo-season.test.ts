import { beforeAll, describe, expect, it } from 'vitest';
import { memberContext } from '@/lib/server/auth/member-context';
import { verifyPassword } from '@/lib/server/auth/password';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { demoId } from '@/lib/server/demo/build/demo-id';
import { nestName, readingName, teamId, userId } from '@/lib/server/demo/build/names';
import { seasonSteps } from '@/lib/server/demo/build/season-steps';
import { demoState } from '@/lib/server/demo/load/demo-state';
import { loadDemoSeason } from '@/lib/server/demo/load-demo-season';
import { BRAM } from '@/lib/server/demo/ossle/people';
import { OSSLE } from '@/lib/server/demo/ossle/ossle';
import { SEASON } from '@/lib/server/demo/season';
import { DEMO_PASSWORD, type Person } from '@/lib/server/demo/story/person';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { IMKE } from '@/lib/server/demo/tarrow/people';
import { TARROW } from '@/lib/server/demo/tarrow/tarrow';
import { nestDetail } from '@/lib/server/queries/nest-detail';
import { readingDetail } from '@/lib/server/queries/reading-detail';
import { countRows } from './count-rows';

/** Cells by state of the eight nests that were read on a visit of their own, by hand from the season's table. */
const CELLS = { N01: 14, N02: 19, N03: 23, N06: 34, N07: 58, N09: 28, N10: 29, N11: 31, N12: 33 };

/** A hundred pushes; a busy machine takes its time. */
const PATIENCE_MS = 240_000;

const contextOf = (team: TeamStory, person: Person) => memberContext(teamId(team), userId(person));
const nestId = (code: string) => demoId(nestName({ code }));

async function readingsOf(ctx: TeamContext, code: string) {
  return (await nestDetail(ctx, nestId(code))).visits.flatMap(({ readings }) => readings);
}

describe('the demo season in a database', () => {
  const heard: string[] = [];
  let imke: TeamContext;

  beforeAll(async () => {
    expect(await loadDemoSeason((line) => heard.push(line))).toBe(true);
    imke = await contextOf(TARROW, IMKE);
  }, PATIENCE_MS);

  it('tells each team as it loads it', () => {
    expect(heard).toEqual(['Tarrow County Underhang Trust: 12 nests', 'Ossle Saltmarsh Wasp Circle: 3 nests']);
  });

  it('is taken as it is: no operation parked, set aside or flagged', async () => {
    expect((await countRows()).quarantined_ops).toBe(0);
    const flagged = await database().models.Op.findAll({ attributes: ['kind', 'flags'], raw: true });
    expect(flagged.filter(({ flags }) => flags !== '' && flags !== '[]')).toEqual([]);
  });

  it('gives each team a log without gaps', async () => {
    for (const team of SEASON) {
      const sent = seasonSteps(team).flatMap((step) => (step.kind === 'push' ? step.ops : []));
      const where = { team_id: toBinary(teamId(team)) };
      const rows = await database().models.Op.findAll({
        attributes: ['seq'],
        where,
        order: [['seq', 'ASC']],
        raw: true,
      });
      expect(rows.map(({ seq }) => Number(seq))).toEqual(sent.map((_, i) => i + 1));
    }
  });

  it('gives everyone the demo password', async () => {
    const users = await database().models.User.findAll({ raw: true });
    expect(users.map(({ email }) => email).sort()).toEqual(
      SEASON.flatMap(({ people }) => people.map(({ email }) => email)).sort(),
    );
    expect(new Set(users.map((user) => user.password_hash)).size).toBe(1);
    expect(await verifyPassword(users[0]?.password_hash ?? null, DEMO_PASSWORD)).toBe(true);
  });

  it.each(Object.entries(CELLS))('shows the first complete reading of %s with %i cells', async (code, cells) => {
    const fields = (await readingsOf(imke, code)).filter(({ kind }) => kind === 'field');
    expect(fields.map(({ tally }) => tally?.cellsTotal)).toEqual(fields.map(() => cells));
    expect(fields.every(({ submittedAt }) => submittedAt !== null)).toBe(true);
  });

  it('shows N12 field, blind and final as counted by hand, locked as version 2', async () => {
    const shown = (await readingsOf(imke, 'N12')).map(({ kind, observer, lockedVersion, tally }) => ({
      kind,
      observer,
      lockedVersion,
      counts: [tally?.capped, tally?.parasitised, tally?.large, tally?.medium, tally?.small, tally?.egg, tally?.empty],
    }));
    expect(shown).toEqual([
      { kind: 'field', observer: 'Senna Vautry', lockedVersion: 2, counts: [6, 1, 6, 4, 6, 9, 1] },
      { kind: 'second', observer: 'Halloran Pike', lockedVersion: null, counts: [7, 0, 7, 4, 5, 10, 0] },
      { kind: 'final', observer: 'Dr Wystan Loos', lockedVersion: 2, counts: [6, 1, 7, 3, 6, 10, 0] },
    ]);
  });

  it('shows N02 settled with the field reader’s larva and not locked', async () => {
    const final = (await readingsOf(imke, 'N02')).find(({ kind }) => kind === 'final');
    expect(final).toMatchObject({ observer: 'Juno Abarra', lockedVersion: null });
    expect(final?.tally).toMatchObject({ cellsTotal: 19, egg: 9, small: 5, medium: 2, empty: 3, nectarCells: 3 });
  });

  it('keeps two teams apart that hold the same ids', async () => {
    const bram = await contextOf(OSSLE, BRAM);
    const reading = demoId(readingName({ code: 'N12' }, { key: 'take-down' }, { key: 'field' }));
    expect((await nestDetail(bram, nestId('N12'))).code).toBe('O02');
    expect((await nestDetail(imke, nestId('N12'))).code).toBe('N12');
    expect((await readingDetail(bram, reading)).tally.cellsTotal).toBe(9);
    expect((await readingDetail(imke, reading)).tally.cellsTotal).toBe(33);
  });

  it('finds nothing to do when it is loaded again, and says so', async () => {
    const before = await countRows();
    const again: string[] = [];
    expect(await loadDemoSeason((line) => again.push(line))).toBe(false);
    expect(again).toEqual(['The demo season is here already.']);
    expect(await countRows()).toEqual(before);
    expect(await demoState()).toBe('loaded');
  });
});
