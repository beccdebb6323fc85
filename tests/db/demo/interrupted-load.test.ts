import { describe, expect, it } from 'vitest';
import { memberContext } from '@/lib/server/auth/member-context';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { teamId, userId } from '@/lib/server/demo/build/names';
import { type SeasonStep, seasonSteps } from '@/lib/server/demo/build/season-steps';
import { demoState } from '@/lib/server/demo/load/demo-state';
import { pushBatch } from '@/lib/server/demo/load/push-batch';
import { takeDecision } from '@/lib/server/demo/load/take-decision';
import { writeTeam } from '@/lib/server/demo/load/write-team';
import { DemoRefused, loadDemoSeason } from '@/lib/server/demo/load-demo-season';
import { SEASON } from '@/lib/server/demo/season';
import { TARROW } from '@/lib/server/demo/tarrow/tarrow';
import { countRows } from './count-rows';

async function take(step: SeasonStep): Promise<void> {
  const ctx = await memberContext(teamId(TARROW), userId(step.by));
  await (step.kind === 'push' ? pushBatch(ctx, step) : takeDecision(ctx, step));
}

/** Loads the first team as far as the settling of N12, and a part of the batch after it. */
async function loadUntilTheLockOfN12(): Promise<void> {
  await writeTeam(TARROW, 'no password yet');
  const steps = seasonSteps(TARROW);
  const locked = steps.findIndex((step) => step.kind === 'decide' && step.decision.act.kind === 'lock');
  for (const step of steps.slice(0, locked)) await take(step);
  const next = steps.slice(locked).find((step) => step.kind === 'push');
  if (next) await take({ ...next, ops: next.ops.slice(0, 2) });
}

/** Two hundred pushes; a busy machine takes its time. */
const PATIENCE_MS = 240_000;

describe('a demo season whose loading was cut short', () => {
  it('is not begun in a database that holds a team of its own', async () => {
    const { Team } = database().models;
    const team = await Team.create({
      id: toBinary(newId()),
      name: 'Our own',
      zone: 'UTC',
      home_lat: null,
      home_lon: null,
    });
    expect(await demoState()).toBe('foreign');
    await expect(loadDemoSeason()).rejects.toThrow(DemoRefused);
    expect(await countRows()).toMatchObject({ teams: 1, users: 0, ops: 0 });
    await Team.destroy({ where: { id: team.id } });
    expect(await demoState()).toBe('empty');
  });

  it(
    'is completed by loading again, with nothing twice',
    async () => {
      await loadUntilTheLockOfN12();
      expect(await demoState()).toBe('unfinished');
      expect(await loadDemoSeason()).toBe(true);
      const sent = SEASON.flatMap(seasonSteps).flatMap((step) => (step.kind === 'push' ? step.ops : []));
      const ofKind = (kind: string) => sent.filter((op) => op.kind === kind).length;
      expect(await countRows()).toMatchObject({
        teams: 2,
        users: 11,
        ops: sent.length,
        quarantined_ops: 0,
        nests: 15,
        visits: ofKind('visit.open'),
        readings: ofKind('reading.open') + 3,
        marks: ofKind('cell.mark'),
        retractions: 1,
        settlements: 5,
        outcomes: 12,
      });
      expect(await demoState()).toBe('loaded');
    },
    PATIENCE_MS,
  );
});
