import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { memberContext } from '@/lib/server/auth/member-context';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { DEMO_PASSWORD } from '@/lib/server/demo/story/person';
import { demoSignIns } from '@/lib/server/auth/demo-sign-ins';
import { nestOutcome } from '@/lib/server/queries/nest-outcome';
import { teamTaxa } from '@/lib/server/queries/team-taxa';
import { makeNest } from '@/tests/support/factories/make-nest';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

let team: TestTeam;
let other: TestTeam;
let ctx: TeamContext;

beforeAll(async () => {
  team = await makeTeam();
  other = await makeTeam({ name: 'Ossle' });
  ctx = await memberContext(team.teamId, team.members.biologist.userId);
});

describe('teamTaxa', () => {
  it('lists the team’s own kinds by name', async () => {
    const add = (teamId: string, scientific_name: string, status: string) =>
      database().models.Taxon.create({ team_id: toBinary(teamId), id: toBinary(v7()), scientific_name, status });
    await add(team.teamId, 'Polistes metricus', 'native');
    await add(team.teamId, 'Polistes dominula', 'introduced');
    await add(other.teamId, 'Polistes annularis', 'native');
    expect(await teamTaxa(ctx)).toEqual([
      { name: 'Polistes dominula', status: 'introduced' },
      { name: 'Polistes metricus', status: 'native' },
    ]);
  });
});

describe('nestOutcome', () => {
  it('is the latest one decided, or none', async () => {
    const nest = await makeNest(team);
    expect(await nestOutcome(ctx, nest)).toBeNull();
    const add = (outcome: string, decided_on: string) =>
      database().models.Outcome.create({
        team_id: toBinary(team.teamId),
        id: toBinary(v7()),
        nest_id: toBinary(nest),
        outcome,
        decided_on,
        note: null,
      });
    await add('raised', '2026-07-10');
    await add('stayed', '2026-06-25');
    expect(await nestOutcome(ctx, nest)).toEqual({ outcome: 'raised', decidedOn: '2026-07-10', note: null });
  });

  it('of another team’s nest does not exist', async () => {
    const nest = await makeNest(other);
    await expect(nestOutcome(ctx, nest)).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('demoSignIns', () => {
  it('names nobody before the demo season is loaded, and then only its own people', async () => {
    expect(await demoSignIns()).toEqual([]);
    const id = toBinary(v7());
    const disabled = toBinary(v7());
    const { User, Membership } = database().models;
    const bare = { password_hash: 'x', disabled_at: null };
    await User.create({ ...bare, id, email: 'reviewer@tarrow.example', display_name: 'Halloran Pike' });
    await User.create({
      ...bare,
      id: disabled,
      email: 'reviewer2@tarrow.example',
      display_name: 'Gone',
      disabled_at: new Date(0),
    });
    for (const user_id of [id, disabled])
      await Membership.create({ team_id: toBinary(team.teamId), user_id, role: 'reviewer' });
    expect(await demoSignIns()).toEqual([
      {
        email: 'reviewer@tarrow.example',
        password: DEMO_PASSWORD,
        name: 'Halloran Pike',
        role: 'reviewer',
        team: team.name,
      },
    ]);
  });
});
