import 'server-only';
import { cellKey } from '@/lib/comb/axial';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';
import { newId } from '@/lib/server/db/new-id';
import { HttpProblem } from '@/lib/server/http/problem';
import { idKey } from '@/lib/server/queries/id-key';
import { liveUpTo, markHistories } from '@/lib/server/queries/mark-history';
import { settlementsOf } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import { selectRows } from '@/lib/server/queries/select-rows';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { checkPicks } from './check-picks';
import { type FinalVersion, ensureFinal, finalVersion, isClosed, updateFinal, versionOf } from './final-reading';
import { judge } from './judged-pair';
import { type LabWork, labWork } from './lab-work';
import type { SettleInput } from './settle-input';

export { SETTLE_INPUT } from './settle-input';

/** The mark that stands in each cell of the reading a final one was made from, by cell key. */
async function marksBehind({ scope, source }: LabWork, final: ReadingRow): Promise<Map<string, string>> {
  const history = (await markHistories(scope, [source.id])).get(idKey(source.id));
  const live = history ? liveUpTo(history, final.base_seq) : [];
  return new Map(live.map((mark) => [cellKey(mark), mark.opId]));
}

/** The number of the last decision about a reading or its final one; 0 before the first. */
async function lastDecision(scope: TeamScope, id: string): Promise<number> {
  if (!isUuidText(id)) return 0;
  const rows = await selectRows<{ last: number | string | null }>(
    scope,
    `SELECT MAX(s.position) AS last FROM settlements s JOIN readings f ON f.team_id = :team AND f.id = s.reading_id
     WHERE s.team_id = :team AND (f.id = :id OR f.based_on = :id)`,
    { id: toBinary(id) },
  );
  return Number(rows[0]?.last ?? 0);
}

/** Two people settling at once would each overrule what they have not seen, so the second is told. */
async function checkNobodyElse({ scope, final }: LabWork, seen: number): Promise<void> {
  const decisions = final ? await settlementsOf(scope, [final.id]) : [];
  const isNews = decisions.some(({ position, actor_id }) => position > seen && !actor_id.equals(scope.user));
  if (isNews) throw new HttpProblem('settled-meanwhile');
}

async function writeSettlements(work: LabWork, final: ReadingRow, decided: { cells: SettleInput['cells']; at: Date }) {
  const { scope } = work;
  const behind = await marksBehind(work, final);
  const last = (await settlementsOf(scope, [final.id])).at(-1)?.position ?? 0;
  await scope.db.models.Settlement.bulkCreate(
    decided.cells.map((cell, index) => ({
      ...cell,
      team_id: scope.team,
      id: toBinary(newId()),
      reading_id: final.id,
      version: versionOf(final),
      position: last + 1 + index,
      mark_op_id: toBinaryOrNull(behind.get(cellKey(cell))),
      pick: cell.pick ?? null,
      actor_id: scope.user,
      created_at: decided.at,
    })),
    { transaction: scope.transaction },
  );
}

/**
 * Puts a reviewer's decisions over a reading. The observer's marks stay as they are; the first decision makes the
 * final reading.
 *
 * @param input `id` of the reading or of its final one, and the cells with reasons.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `blind`, `locked` while the final reading is locked, `settled-meanwhile` when
 * somebody else decided something since, `not-primary`, `lead-settles`, or `pick`.
 */
export async function settleReading(
  ctx: TeamContext,
  input: SettleInput & { id: string },
  nowMs: number,
): Promise<FinalVersion> {
  const { id, cells } = input;
  const seen = input.seen ?? (await lastDecision(teamScope(ctx), id));
  const decision = await labWork(ctx, { id, nowMs }, async (work) => {
    if (isClosed(work)) throw new HttpProblem('locked');
    await checkNobodyElse(work, seen);
    checkPicks(cells, (await judge(ctx, work)).comparison);
    const final = await ensureFinal(work, nowMs);
    await writeSettlements(work, final, { cells, at: new Date(nowMs) });
    await updateFinal(work, final, { opened_by: work.scope.user });
    const detail = { cells: cells.map(({ q, r, state }) => ({ q, r, state })) };
    return { action: 'reading.settle', final, version: versionOf(final), detail };
  });
  return finalVersion(decision);
}
