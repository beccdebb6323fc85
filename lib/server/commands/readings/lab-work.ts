import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { lockCounter } from '@/lib/server/commands/push/lock-counter';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { visibleReading } from '@/lib/server/queries/reading-detail';
import { type ReadingRow, finalOf, readingById } from '@/lib/server/queries/reading-rows';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';

/** What every command on a final reading starts from, read after the team's other writers were locked out. */
export interface LabWork {
  scope: TeamScope;
  /** The reading whose marks count. */
  source: ReadingRow;
  /** The final reading made from it; null before the first decision. */
  final: ReadingRow | null;
  /** The last place in the team's log. */
  seq: number;
  counter: Awaited<ReturnType<typeof lockCounter>>;
}

/** Both halves of a reading that may be asked for by either id. */
async function halvesOf(scope: TeamScope, asked: ReadingRow): Promise<Pick<LabWork, 'source' | 'final'>> {
  if (asked.based_on === null) return { source: asked, final: await finalOf(scope, asked.id) };
  const source = await readingById(scope, asked.based_on);
  if (!source) throw new Error('a final reading has lost the reading it is based on');
  return { source, final: asked };
}

/**
 * Runs a command on a reading in one transaction; the team's counter row is locked first, so decisions and pushes
 * of a team happen one after the other.
 *
 * @param id of a field, second or final reading, as it stands in the address.
 * @throws HttpProblem `not-found`, or `blind` while the person has an own second reading open at this visit.
 */
export async function labWork<Result>(
  ctx: TeamContext,
  id: string,
  work: (work: LabWork) => Promise<Result>,
): Promise<Result> {
  return inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const scope = { ...teamScope(ctx), transaction };
    const halves = await halvesOf(scope, await visibleReading(scope, id));
    return work({ scope, ...halves, seq: counter.seq, counter });
  });
}
