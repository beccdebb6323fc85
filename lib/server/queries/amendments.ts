import 'server-only';
import type { NameOf } from './member-names';
import type { TeamScope } from './team-scope';

/** The opening of a new version of a locked reading. */
export interface Amendment {
  /** The version it opened. */
  version: number;
  reason: string;
  /** Display name. */
  actor: string;
  /** ISO 8601 UTC. */
  at: string;
}

/** The members of an amendment's audit detail. */
function readDetail(text: string): Pick<Amendment, 'version' | 'reason'> {
  const parsed: unknown = JSON.parse(text);
  const { version, reason }: { version?: unknown; reason?: unknown } =
    parsed !== null && typeof parsed === 'object' ? parsed : {};
  return { version: Number(version), reason: typeof reason === 'string' ? reason : '' };
}

/** The amendments of a final reading, oldest first, from the audit chain, the only place that holds their reasons. */
export async function amendmentsOf(
  { team, db, transaction }: TeamScope,
  final: Buffer,
  nameOf: NameOf,
): Promise<Amendment[]> {
  const entries = await db.models.AuditEntry.findAll({
    where: { team_id: team, subject_id: final, action: 'reading.amend' },
    order: [['seq', 'ASC']],
    raw: true,
    transaction,
  });
  return entries.map(({ detail, actor_id, at }) => ({
    ...readDetail(detail),
    actor: actor_id ? nameOf(actor_id) : '',
    at: at.toISOString(),
  }));
}
