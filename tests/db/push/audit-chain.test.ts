import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { auditHash } from '@/lib/server/commands/push/write-audit';
import { database } from '@/lib/server/db/database';
import { fromBinary, fromBinaryOrNull, toBinary } from '@/lib/server/db/uuid-binary';
import type { AuditEntry } from '@/models/audit-entry';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs } from '@/tests/support/push/push-as';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
  for (let i = 0; i < 5; i++) {
    await pushAs(team, team.members.technician, [wireOp({ kind: 'nest.open', nest: v7(), body: { code: `N${i}` } })]);
  }
});

async function chain(): Promise<AuditEntry[]> {
  return database().models.AuditEntry.findAll({ where: { team_id: toBinary(team.teamId) }, order: ['seq'] });
}

/** Does every entry carry the hash of the one before, and its own? */
function verifies(entries: readonly AuditEntry[]): boolean {
  let previous: Buffer = Buffer.alloc(32);
  return entries.every((entry, index) => {
    const { at, action, detail } = entry;
    const link = {
      teamId: fromBinary(entry.team_id),
      seq: Number(entry.seq),
      actorId: fromBinaryOrNull(entry.actor_id),
      subjectId: fromBinaryOrNull(entry.subject_id),
      at,
      action,
      detail,
    };
    const hash = auditHash(previous, link);
    const holds = link.seq === index + 1 && entry.previous_hash.equals(previous) && entry.hash.equals(hash);
    previous = hash;
    return holds;
  });
}

describe('the audit chain (I22)', () => {
  it('verifies from its first entry to the head the counter holds', async () => {
    const entries = await chain();
    expect(entries).toHaveLength(5);
    expect(verifies(entries)).toBe(true);
    const counter = await database().models.TeamCounter.findOne({
      where: { team_id: toBinary(team.teamId) },
      rejectOnEmpty: true,
    });
    expect(entries.at(-1)?.hash).toEqual(counter.audit_hash);
    expect(counter.audit_seq).toBe(5);
  });

  it('shows any edit, deletion or exchange', async () => {
    const edits: ((entry: AuditEntry) => unknown)[] = [
      (entry) => (entry.detail = entry.detail.replace('"applied":1', '"applied":2')),
      (entry) => (entry.action = 'settle'),
      (entry) => (entry.at = new Date(entry.at.getTime() + 1)),
      (entry) => (entry.actor_id = toBinary(v7())),
      (entry) => (entry.hash = Buffer.alloc(32)),
    ];
    for (const edit of edits) {
      const entries = await chain();
      const entry = entries[2];
      if (!entry) throw new Error('five entries');
      edit(entry);
      expect(verifies(entries)).toBe(false);
    }
    const entries = await chain();
    expect(verifies(entries.filter((_, index) => index !== 2))).toBe(false);
    const [a, b, ...rest] = entries;
    expect(verifies([b, a, ...rest].flatMap((entry) => entry ?? []))).toBe(false);
  });
});
