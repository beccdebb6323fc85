import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { isSupported } from '@/lib/protocol/validate-op';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { isRole } from '@/lib/server/auth/role';
import { database } from '@/lib/server/db/database';
import { fromBinary, fromBinaryOrNull, toBinary } from '@/lib/server/db/uuid-binary';
import type { Actor } from './world';

/** A parked operation, without its text. */
export interface ParkedRow {
  id: string;
  opId: string | null;
  /** Ids it waits for, or the kind and version (`kind@version`) that the server did not know. */
  missing: readonly string[];
}

/** A parked operation with what is needed to try it again. */
export interface ParkedText {
  id: string;
  raw: string;
  by: Actor;
  receivedMs: number;
}

/** What an operation of an unknown kind waits for. A name nobody would give a kind is left out. */
export function kindToken(kind: unknown, kindV: unknown): string[] {
  return typeof kind === 'string' && kind.length <= 100 ? [`${kind}@${String(kindV)}`] : [];
}

/** Has the server learned this kind since? */
function isKnownToken(token: string): boolean {
  const at = token.lastIndexOf('@');
  return at > 0 && isSupported(token.slice(0, at), Number(token.slice(at + 1)));
}

/** Everything the team has parked. */
export async function loadParked(ctx: TeamContext, transaction: Transaction): Promise<Map<string, ParkedRow>> {
  const rows = await database().models.QuarantinedOp.findAll({
    attributes: ['id', 'op_id', 'missing'],
    where: { team_id: toBinary(ctx.teamId), state: 'parked' },
    transaction,
  });
  const parked = rows.map((row) => {
    const missing: unknown = JSON.parse(row.missing);
    return {
      id: fromBinary(row.id),
      opId: fromBinaryOrNull(row.op_id),
      missing: Array.isArray(missing) ? missing.map(String) : [],
    };
  });
  return new Map(parked.map((row) => [row.id, row]));
}

/** Takes out of `parked` the rows that have a reason to be tried again. */
export function takeTouched(parked: Map<string, ParkedRow>, arrived: ReadonlySet<string>): string[] {
  const touched = [...parked.values()].filter(({ missing }) =>
    missing.some((id) => arrived.has(id) || isKnownToken(id)),
  );
  for (const { id } of touched) parked.delete(id);
  return touched.map(({ id }) => id);
}

interface TextRow {
  id: Buffer;
  raw: string;
  actorId: Buffer;
  role: string;
  receivedAt: Date;
}

/** The texts of parked operations in the order they arrived, with the role their senders have now. */
export async function loadTexts(
  ctx: TeamContext,
  ids: readonly string[],
  transaction: Transaction,
): Promise<ParkedText[]> {
  const rows = await database().sequelize.query<TextRow>(
    `SELECT p.id AS id, p.raw AS raw, p.actor_id AS actorId, m.role AS role, p.received_at AS receivedAt
     FROM quarantined_ops p JOIN memberships m ON m.team_id = p.team_id AND m.user_id = p.actor_id
     WHERE p.team_id = ? AND p.id IN (?) ORDER BY p.received_at, p.id`,
    { type: QueryTypes.SELECT, replacements: [toBinary(ctx.teamId), ids.map(toBinary)], transaction },
  );
  return rows.flatMap(({ id, raw, actorId, role, receivedAt }) =>
    isRole(role)
      ? [{ id: fromBinary(id), raw, by: { userId: fromBinary(actorId), role }, receivedMs: receivedAt.getTime() }]
      : [],
  );
}
