import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { auditedWrite } from '@/lib/server/commands/audited-write';
import type { AuditEvent } from '@/lib/server/commands/push/write-audit';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { nestById } from '@/lib/server/queries/nest-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import { temperatureById } from '@/lib/server/queries/temperature/temperature-rows';

/** Which record, why, and when (epoch milliseconds). */
interface TakenOut {
  id: string;
  reason: string;
  nowMs: number;
}

/**
 * Takes a record out of force within a write; text and values stay.
 *
 * @returns what the audit chain says about it.
 * @throws HttpProblem `not-found`, or `temperature-removed` when it is out of force already.
 */
export async function takeOut(
  scope: TeamScope,
  nest: Buffer,
  { id, reason, nowMs }: TakenOut,
): Promise<Omit<AuditEvent, 'at'>> {
  const row = await temperatureById(scope, nest, id);
  if (row.removed_at) throw new HttpProblem('temperature-removed');
  await scope.db.models.Temperature.update(
    { removed_by: scope.user, removed_at: new Date(nowMs), removed_reason: reason },
    { where: { team_id: scope.team, id: row.id }, transaction: scope.transaction },
  );
  return { action: 'temperature.remove', subjectId: id, detail: { nest: fromBinary(nest), reason } };
}

/**
 * Takes a temperature record out of force, with the reason; it stays on file.
 *
 * @param path the ids of nest and record, as they stand in the address.
 * @throws HttpProblem `not-found`, or `temperature-removed`.
 */
export async function removeTemperature(
  ctx: TeamContext,
  { path, reason }: { path: { id: string; record: string }; reason: string },
  nowMs: number,
): Promise<{ id: string }> {
  return auditedWrite(ctx, nowMs, async (scope) => {
    const nest = await nestById(scope, path.id);
    const event = await takeOut(scope, nest.id, { id: path.record, reason, nowMs });
    return { result: { id: path.record }, events: [event] };
  });
}
