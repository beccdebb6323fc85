import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Random, seededRandom } from '@/lib/kit/random';
import { type AuditSnapshot, type StoredLink, auditSnapshot } from '@/lib/server/audit/audit-snapshot';
import { knowsHead, verifyAudit } from '@/lib/server/audit/verify-audit';
import { auditHash } from '@/lib/server/commands/push/write-audit';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { makeDecidedTeam } from '@/tests/support/audit/decided-team';

const TAMPERINGS = 1000;
const SEED = 20261201;

let honest: AuditSnapshot;

beforeAll(async () => {
  const team = await makeDecidedTeam();
  const db = database();
  honest = await db.sequelize.transaction((transaction) =>
    auditSnapshot({ team: toBinary(team.teamId), user: Buffer.alloc(16), db, transaction }),
  );
});

function pick<T>(items: readonly T[], random: Random): T {
  const item = items[Math.floor(random() * items.length)];
  if (item === undefined) throw new Error('nothing to pick from');
  return item;
}

/** Another value of the same kind. */
function other(value: unknown): unknown {
  if (typeof value === 'number') return value + 1;
  if (value === null) return 'something';
  const text = String(value);
  if (/^\d{4}-.*Z$/.test(text)) return new Date(Date.parse(text) + 1).toISOString();
  const last = text.slice(-1);
  return `${text.slice(0, -1)}${last === '0' ? '1' : '0'}`;
}

/** Changes one member of a row: any of them. */
function edit(row: object, random: Random): void {
  const members = row as Record<string, unknown>;
  const name = pick(Object.keys(members), random);
  members[name] = other(members[name]);
}

function remove(rows: unknown[], random: Random): void {
  rows.splice(Math.floor(random() * rows.length), 1);
}

function swap<Row extends object>(rows: Row[], random: Random, name: keyof Row): void {
  const first = pick(rows, random);
  const second = pick(
    rows.filter((row) => row[name] !== first[name]),
    random,
  );
  [first[name], second[name]] = [second[name], first[name]];
}

/** Writes the chain anew from some entry on, as somebody who knows how would, but can't reach the counter. */
function rewrite(entries: StoredLink[], random: Random): void {
  const from = Math.floor(random() * entries.length);
  const changed = entries[from];
  if (changed) changed.detail = changed.detail.replace('{', '{"x":1,');
  let previous = entries[from - 1]?.hash ?? '0'.repeat(64);
  for (const entry of entries.slice(from)) {
    entry.previousHash = previous;
    const { previousHash: _, hash: __, at, ...link } = entry;
    entry.hash = auditHash(Buffer.from(previous, 'hex'), { ...link, at: new Date(at) }).toString('hex');
    previous = entry.hash;
  }
}

type Tampering = (snapshot: AuditSnapshot, random: Random) => void;

const TAMPERING: Readonly<Record<string, Tampering>> = {
  'edit a decision': ({ settlements }, random) => edit(pick(settlements, random), random),
  'edit a lock': ({ locks }, random) => edit(pick(locks, random), random),
  'drop a lock': ({ locks }, random) => remove(locks, random),
  'edit a final reading': ({ finals }, random) => edit(pick(finals, random), random),
  'edit an entry': ({ entries }, random) => edit(pick(entries, random), random),
  'change the marks behind': ({ marks, finals }, random) => void (marks[pick(finals, random).id] = 'ff'.repeat(32)),
  'delete a decision': ({ settlements }, random) => remove(settlements, random),
  'delete a final reading': ({ finals }, random) => remove(finals, random),
  'delete an entry': ({ entries }, random) => remove(entries, random),
  'cut the chain off': ({ entries }, random) => void entries.splice(Math.floor(random() * entries.length)),
  'insert a decision': ({ settlements }, random) =>
    void settlements.push({ ...pick(settlements, random), id: v7(), position: 1 + Math.floor(random() * 9) }),
  'insert a final reading': ({ finals }, random) => void finals.push({ ...pick(finals, random), id: v7() }),
  'insert an entry': ({ entries }, random) => {
    const at = Math.floor(random() * entries.length);
    entries.splice(at, 0, { ...pick(entries, random), seq: at + 1 });
    entries.slice(at + 1).forEach((entry) => (entry.seq += 1));
  },
  'exchange the places of decisions': ({ settlements }, random) => swap(settlements, random, 'position'),
  'exchange what decisions say': ({ settlements }, random) => swap(settlements, random, 'reason'),
  'exchange the versions of final readings': ({ finals }, random) => swap(finals, random, 'version'),
  'exchange entries': ({ entries }, random) => {
    swap(entries, random, 'seq');
    entries.sort((a, b) => a.seq - b.seq);
  },
  'write the chain anew': ({ entries }, random) => rewrite(entries, random),
};

describe('the check of the audit chain', () => {
  it('finds nothing in what the lab wrote', () => {
    expect(verifyAudit(honest)).toEqual([]);
    expect([honest.entries.length, honest.finals.length, honest.settlements.length]).toEqual([13, 4, 16]);
  });

  it(`finds all of ${TAMPERINGS} random tamperings of eighteen kinds (seed ${SEED})`, () => {
    const random = seededRandom(SEED);
    const kinds = Object.keys(TAMPERING);
    const unseen: string[] = [];
    for (let at = 0; at < TAMPERINGS; at += 1) {
      const kind = kinds[at % kinds.length] ?? '';
      const snapshot = structuredClone(honest);
      TAMPERING[kind]?.(snapshot, random);
      if (verifyAudit(snapshot).length === 0) unseen.push(`${at} ${kind}`);
    }
    expect(unseen).toEqual([]);
  }, 60_000);

  it('names the first broken link first', () => {
    const snapshot = structuredClone(honest);
    for (const seq of [9, 4]) {
      const entry = snapshot.entries[seq - 1];
      if (entry) entry.action = 'push';
    }
    expect(verifyAudit(snapshot)[0]).toEqual({ seq: 4, found: 'was changed after it was written' });
  });

  it('names the entry that first sealed a decision which was changed later', () => {
    const snapshot = structuredClone(honest);
    const [final] = snapshot.finals;
    const decision = snapshot.settlements.find(({ reading, position }) => reading === final?.id && position === 3);
    if (decision) decision.reason = 'Something else.';
    const sealing = snapshot.entries.filter(({ subjectId }) => subjectId === final?.id);
    expect(verifyAudit(snapshot)[0]?.seq).toBe(sealing[1]?.seq);
  });

  it('needs a head that was noted elsewhere when the counter is rewritten too', () => {
    const snapshot = structuredClone(honest);
    const noted = snapshot.head.hash;
    // An entry that seals nothing, so that only the chain itself could give it away.
    const last = snapshot.entries.at(-1);
    rewrite(snapshot.entries, () => 0);
    snapshot.head.hash = last?.hash ?? '';
    expect(verifyAudit(snapshot)).toEqual([]);
    expect([knowsHead(snapshot, noted), knowsHead(honest, noted)]).toEqual([false, true]);
  });
});
