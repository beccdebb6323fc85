import 'server-only';
import { groupBy } from '@/lib/kit/group-by';
import { auditHash } from '@/lib/server/commands/push/write-audit';
import type { AuditSnapshot, StoredLink } from './audit-snapshot';
import { finalDigest, lockedDigest, readSeal, type Seal, settledDigest } from './seal';
import type { SealedLock, SealedSettlement } from './sealed-rows';

/** Something that is not as the chain says. */
export interface AuditFault {
  /** The entry it shows at; null when no entry speaks of it. */
  seq: number | null;
  /** What was found, as a sentence. */
  found: string;
}

const FIRST_PREVIOUS = '0'.repeat(64);

function hashOf({ at, previousHash, ...link }: StoredLink): string | null {
  const time = new Date(Date.parse(at));
  return auditHash(Buffer.from(previousHash, 'hex'), { ...link, at: time }).toString('hex');
}

/** Is every entry in its place, carrying the hash of the one before and its own? */
function* chainFaults({ entries, head }: AuditSnapshot): Generator<AuditFault> {
  let previous = FIRST_PREVIOUS;
  for (const [index, entry] of entries.entries()) {
    const { seq } = entry;
    if (seq !== index + 1) {
      yield { seq: index + 1, found: `entry ${index + 1} is missing: number ${seq} stands in its place` };
      return;
    }
    if (entry.previousHash !== previous) yield { seq, found: 'does not follow from the entry before it' };
    else if (entry.hash !== hashOf(entry)) yield { seq, found: 'was changed after it was written' };
    previous = entry.hash;
  }
  const last = entries.at(-1)?.seq ?? 0;
  if (last !== head.seq) {
    yield { seq: Math.min(last, head.seq) + 1, found: `the chain ends at ${last}, the counter says ${head.seq}` };
  } else if (previous !== head.hash) yield { seq: last, found: 'is not the head the counter holds' };
}

/** An entry that vouches for a final reading. */
interface Sealing {
  seq: number;
  seal: Seal;
}

function sealingsBySubject(entries: readonly StoredLink[]): Map<string, Sealing[]> {
  const sealings = entries.flatMap(({ seq, subjectId, detail }) => {
    const seal = subjectId === null ? null : readSeal(detail);
    return seal && subjectId !== null ? [{ subjectId, seq, seal }] : [];
  });
  return groupBy(sealings, ({ subjectId }) => subjectId);
}

/** One final reading as the entries and the rows speak of it. */
interface Sealed {
  id: string;
  sealings: readonly Sealing[];
  settlements: readonly SealedSettlement[];
  locks: readonly SealedLock[];
}

/** Do the rows of one final reading match every entry that sealed it? */
function* sealFaults(snapshot: AuditSnapshot, { id, sealings, settlements, locks }: Sealed): Generator<AuditFault> {
  const final = snapshot.finals.find((row) => row.id === id);
  const last = sealings.at(-1);
  if (!last) return;
  if (!final) {
    yield { seq: last.seq, found: `final reading ${id} is gone` };
    return;
  }
  for (const { seq, seal } of sealings) {
    if (seal.settled !== settledDigest(settlements, seal.settlements)) {
      yield { seq, found: `the decisions about final reading ${id} are not those it sealed` };
    }
    if (seal.locked !== lockedDigest(locks, seal.locks)) {
      yield { seq, found: `the locks of final reading ${id} are not those it sealed` };
    }
    if (seal.marks !== snapshot.marks[id]) yield { seq, found: `the marks behind final reading ${id} have changed` };
  }
  if (settlements.length > last.seal.settlements) {
    yield { seq: last.seq, found: `final reading ${id} has decisions that no entry speaks of` };
  }
  if (locks.length > last.seal.locks) {
    yield { seq: last.seq, found: `final reading ${id} has locks that no entry speaks of` };
  }
  if (last.seal.final !== finalDigest(final)) {
    yield { seq: last.seq, found: `final reading ${id} is not as it was sealed` };
  }
}

/** Rows that no entry vouches for. */
function* strangers(snapshot: AuditSnapshot, known: ReadonlyMap<string, unknown>): Generator<AuditFault> {
  for (const { id } of snapshot.finals) {
    if (!known.has(id)) yield { seq: null, found: `final reading ${id} is in no entry` };
  }
  for (const { version, reading } of snapshot.locks) {
    if (!known.has(reading)) yield { seq: null, found: `lock ${version} belongs to no reading the chain knows` };
  }
  for (const { id, reading } of snapshot.settlements) {
    if (!known.has(reading)) yield { seq: null, found: `decision ${id} belongs to no reading the chain knows` };
  }
}

function byPlace(a: AuditFault, b: AuditFault): number {
  return (a.seq ?? Infinity) - (b.seq ?? Infinity);
}

/**
 * Checks a team's audit chain, link by link, and that the final readings, the decisions about their cells, their
 * locks and the marks behind them are what the chain says.
 *
 * An attacker who rewrites the chain from some entry on, together with the head in the counter, is found only by
 * comparing with a head that was noted elsewhere; see `knowsHead`.
 *
 * @returns every fault, the earliest link first; none when all is as it was written.
 */
export function verifyAudit(snapshot: AuditSnapshot): AuditFault[] {
  const sealings = sealingsBySubject(snapshot.entries);
  const settlements = groupBy(snapshot.settlements, ({ reading }) => reading);
  const locks = groupBy(snapshot.locks, ({ reading }) => reading);
  const faults = [...chainFaults(snapshot)];
  for (const [id, own] of sealings) {
    const rows = { settlements: settlements.get(id) ?? [], locks: locks.get(id) ?? [] };
    faults.push(...sealFaults(snapshot, { id, sealings: own, ...rows }));
  }
  faults.push(...strangers(snapshot, sealings));
  return faults.sort(byPlace);
}

/** Is this hash, noted earlier, that of a link of the chain? */
export function knowsHead({ entries }: AuditSnapshot, hash: string): boolean {
  return entries.some((entry) => entry.hash === hash);
}
