import { memberContext } from '@/lib/server/auth/member-context';
import { amendReading } from '@/lib/server/commands/readings/amend-reading';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { settleReading } from '@/lib/server/commands/readings/settle-reading';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Marks } from '@/tests/support/n12';

const DECIDED_MS = Date.parse('2026-06-22T09:15:00-04:00');

/** A team whose reviewer settled four readings in two goes each, locked three, and amended one of those. */
export async function makeDecidedTeam(): Promise<TestTeam & { sources: string[] }> {
  const team = await makeTeam();
  const ctx = await memberContext(team.teamId, team.members.reviewer.userId);
  const sources: string[] = [];
  for (const code of ['N01', 'N02', 'N03', 'N04']) {
    const nest = await makeNest(team, { code });
    const visit = await makeVisit(team, nest);
    const id = await makeReading(team, { nest, visit, marks: n12Marks('field') });
    const cell = (q: number, state: 'egg' | 'large') => ({ q, r: 0, state, reason: `By the photo of ${code}.` });
    await settleReading(ctx, { id, cells: [cell(0, 'large'), cell(1, 'egg')] }, DECIDED_MS);
    await settleReading(ctx, { id, cells: [cell(-1, 'large'), cell(2, 'egg')] }, DECIDED_MS + 60_000);
    if (code !== 'N04') await lockReading(ctx, { id }, DECIDED_MS + 120_000);
    sources.push(id);
  }
  const [first = ''] = sources;
  await amendReading(ctx, { id: first, reason: 'A later photo.' }, DECIDED_MS + 180_000);
  await lockReading(ctx, { id: first }, DECIDED_MS + 240_000);
  return { ...team, sources };
}
