import 'server-only';
import type { Json } from '@/lib/protocol/canonical-json';
import { loadSealedReading } from '@/lib/server/audit/load-sealed';
import { sealOf } from '@/lib/server/audit/seal';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type Counter, lockCounter, saveCounter } from '@/lib/server/commands/push/lock-counter';
import { writeAudit } from '@/lib/server/commands/push/write-audit';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { fromBinary } from '@/lib/server/db/uuid-binary';
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
  /** Where the team's log stands. */
  counter: Counter;
}

/** What a command did to a final reading. */
export interface LabDecision {
  action: 'reading.settle' | 'reading.accept' | 'reading.lock' | 'reading.amend';
  final: ReadingRow;
  version: number;
  /** Beside the reading it is based on and the version. */
  detail: { [key: string]: Json };
}

/** Both halves of a reading that may be asked for by either id. */
async function halvesOf(scope: TeamScope, asked: ReadingRow): Promise<Pick<LabWork, 'source' | 'final'>> {
  if (asked.based_on === null) return { source: asked, final: await finalOf(scope, asked.id) };
  const source = await readingById(scope, asked.based_on);
  if (!source) throw new Error('a final reading has lost the reading it is based on');
  return { source, final: asked };
}

/**
 * Runs a decision about a reading in one transaction and adds it to the team's audit chain. The team's counter row is
 * locked first, so that decisions and pushes of a team happen one after the other.
 *
 * @param id of a field, second or final reading, as it stands in the address.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, or `blind` while the person has an own second reading open at this visit.
 */
export async function labWork(
  ctx: TeamContext,
  { id, nowMs }: { id: string; nowMs: number },
  decide: (work: LabWork) => Promise<LabDecision>,
): Promise<LabDecision> {
  return inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const scope = { ...teamScope(ctx), transaction };
    const halves = await halvesOf(scope, await visibleReading(scope, id));
    const decision = await decide({ scope, ...halves, counter });
    const { action, final, version } = decision;
    // What the rows say now goes into the chain: a later change of any of them shows.
    const seal = { ...sealOf(await loadSealedReading(scope, final.id)) };
    const detail = { basedOn: fromBinary(halves.source.id), version, ...decision.detail, seal };
    await writeAudit(
      { ctx, counter, transaction },
      { action, subjectId: fromBinary(final.id), detail, at: new Date(nowMs) },
    );
    await saveCounter(ctx, counter, transaction);
    return decision;
  });
}
