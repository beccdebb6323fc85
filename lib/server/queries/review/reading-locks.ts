import 'server-only';
import type { NameOf } from '@/lib/server/queries/member-names';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** One locked version of a final reading. */
export interface LockAnswer {
  version: number;
  /** Lower-case hex SHA-256 of its cells. */
  hash: string;
  settingsVersion: number;
  /** Who stands behind it, as their names were then. */
  field: string;
  /** Null where nobody read the comb a second time. */
  second: string | null;
  settled: string[];
  lockedBy: string;
  /** ISO 8601 UTC. */
  at: string;
}

function textOf(value: unknown): string | null {
  return typeof value === 'string' ? value : null;
}

function namesOf(json: string): Pick<LockAnswer, 'field' | 'second' | 'settled'> {
  const parsed: unknown = JSON.parse(json);
  const { field, second, settled }: { field?: unknown; second?: unknown; settled?: unknown } =
    parsed !== null && typeof parsed === 'object' ? parsed : {};
  const names = Array.isArray(settled) ? settled.filter((name) => typeof name === 'string') : [];
  return { field: textOf(field) ?? '', second: textOf(second), settled: names };
}

/** The locked versions of a final reading, the first one first. */
export async function locksOf(
  { team, db, transaction }: TeamScope,
  final: Buffer,
  nameOf: NameOf,
): Promise<LockAnswer[]> {
  const rows = await db.models.ReadingLock.findAll({
    where: { team_id: team, reading_id: final },
    order: [['version', 'ASC']],
    raw: true,
    transaction,
  });
  return rows.map(({ version, cells_hash, settings_version, names, actor_id, locked_at }) => ({
    version,
    hash: cells_hash.toString('hex'),
    settingsVersion: settings_version,
    ...namesOf(names),
    lockedBy: nameOf(actor_id),
    at: locked_at.toISOString(),
  }));
}
