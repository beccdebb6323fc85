import 'server-only';
import { Op as Operator, type Transaction } from 'sequelize';
import { isUuidText } from '@/lib/kit/uuid';
import type { Json } from '@/lib/protocol/canonical-json';
import type { OpCode } from '@/lib/protocol/op-codes';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { fromBinary, toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';

/** Why something is kept aside instead of standing in the log. */
export type AsideState = 'parked' | 'quarantined' | 'conflict' | 'refused';

/** Something to be kept aside whole. */
export interface AsideEntry {
  digest: string;
  opId: Json;
  state: AsideState;
  code: OpCode;
  raw: string;
  /** What a parked one waits for. */
  missing: readonly string[];
  actorId: string;
  receivedMs: number;
}

/** What a run changes among the things kept aside. */
export class Aside {
  private readonly entries = new Map<string, AsideEntry>();
  private readonly settledDigests = new Set<string>();
  private readonly changed = new Map<string, { state: AsideState; code: OpCode; missing: string }>();
  private readonly settledIds = new Set<string>();

  /** Keeps something aside; the same content is kept once. */
  keep(entry: AsideEntry): void {
    this.entries.set(entry.digest, entry);
  }

  /** The content stands in the log now, so a copy kept aside earlier has served. */
  settleDigest(digest: string): void {
    this.settledDigests.add(digest);
  }

  /** A row kept aside earlier has another state or waits for something else. */
  change(id: string, row: Pick<AsideEntry, 'state' | 'code' | 'missing'>): void {
    this.changed.set(id, { state: row.state, code: row.code, missing: JSON.stringify(row.missing) });
  }

  /** A row kept aside earlier stands in the log now. */
  settleId(id: string): void {
    this.settledIds.add(id);
  }

  /** How many things were newly kept aside. */
  get size(): number {
    return this.entries.size;
  }

  /** Writes it all. Content that is kept aside already is not kept twice. */
  async write(ctx: TeamContext, transaction: Transaction): Promise<void> {
    const { QuarantinedOp } = database().models;
    const team = { team_id: toBinary(ctx.teamId) };
    const known = await this.knownRows(ctx, transaction);
    for (const [digest, id] of known) if (this.settledDigests.has(digest)) this.settledIds.add(id);
    for (const [id, columns] of this.changed)
      await QuarantinedOp.update(columns, { where: { ...team, id: toBinary(id) }, transaction });
    const settled = [...this.settledIds].map(toBinary);
    if (settled.length > 0) await QuarantinedOp.destroy({ where: { ...team, id: settled }, transaction });
    const fresh = [...this.entries.values()].filter(({ digest }) => !known.has(digest));
    await QuarantinedOp.bulkCreate(
      fresh.map((entry) => ({ ...team, ...asideColumns(entry) })),
      { transaction },
    );
  }

  /** Rows, by digest, that already hold content this run is about. */
  private async knownRows(ctx: TeamContext, transaction: Transaction): Promise<Map<string, string>> {
    const digests = [...new Set([...this.entries.keys(), ...this.settledDigests])].map((digest) =>
      Buffer.from(digest, 'hex'),
    );
    if (digests.length === 0) return new Map();
    const rows = await database().models.QuarantinedOp.findAll({
      attributes: ['id', 'digest'],
      where: { team_id: toBinary(ctx.teamId), digest: { [Operator.in]: digests } },
      transaction,
    });
    return new Map(rows.map((row) => [row.digest.toString('hex'), fromBinary(row.id)]));
  }
}

function asideColumns({ digest, opId, state, code, raw, missing, actorId, receivedMs }: AsideEntry) {
  return {
    id: toBinary(newId()),
    digest: Buffer.from(digest, 'hex'),
    op_id: toBinaryOrNull(isUuidText(opId) ? opId : null),
    state,
    code,
    raw,
    missing: JSON.stringify(missing),
    actor_id: toBinary(actorId),
    received_at: new Date(receivedMs),
  };
}
