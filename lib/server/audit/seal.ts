import 'server-only';
import { createHash } from 'node:crypto';
import { type Json, canonicalJson } from '@/lib/protocol/canonical-json';
import type { SealedFinal, SealedLock, SealedMark, SealedRetraction, SealedSettlement } from './sealed-rows';

/** A final reading with everything it is made of. */
export interface SealedReading {
  final: SealedFinal;
  settlements: readonly SealedSettlement[];
  locks: readonly SealedLock[];
  marks: readonly SealedMark[];
  retractions: readonly SealedRetraction[];
}

/** What an audit entry says about the rows of a final reading at its moment; hashes are lower-case hex. */
export interface Seal {
  /** Of the row of the final reading. */
  final: string;
  /** How many decisions there were. */
  settlements: number;
  /** Of those decisions in their order. */
  settled: string;
  /** How many versions were locked. */
  locks: number;
  /** Of those locks in the order of their versions. */
  locked: string;
  /** Of the marks and retractions the final reading stands on. */
  marks: string;
}

function digest(value: Json): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}

/** The hash of the first `count` decisions, by position and then id. */
export function settledDigest(settlements: readonly SealedSettlement[], count: number): string {
  const inOrder = [...settlements].sort((a, b) => a.position - b.position || (a.id < b.id ? -1 : 1));
  return digest(inOrder.slice(0, count));
}

/** The hash of the first `count` locks, by version. */
export function lockedDigest(locks: readonly SealedLock[], count: number): string {
  return digest([...locks].sort((a, b) => a.version - b.version).slice(0, count));
}

/** The hash of the row of a final reading. */
export function finalDigest(final: SealedFinal): string {
  return digest(final);
}

/** The hash of the marks that count: later ones don't move a final reading, so they are not part of it. */
export function marksDigest({
  final,
  marks,
  retractions,
}: Pick<SealedReading, 'final' | 'marks' | 'retractions'>): string {
  const counts = ({ seq }: { seq: number }) => seq <= (final.baseSeq ?? 0);
  const bySeq = (a: { seq: number }, b: { seq: number }) => a.seq - b.seq;
  return digest({ marks: marks.filter(counts).sort(bySeq), retractions: retractions.filter(counts).sort(bySeq) });
}

/** Seals a final reading as it stands. */
export function sealOf(reading: SealedReading): Seal {
  const { final, settlements, locks } = reading;
  return {
    final: finalDigest(final),
    settlements: settlements.length,
    settled: settledDigest(settlements, settlements.length),
    locks: locks.length,
    locked: lockedDigest(locks, locks.length),
    marks: marksDigest(reading),
  };
}

/** The seal in an entry's detail; null for an entry that seals nothing. */
export function readSeal(detail: string): Seal | null {
  let parsed: unknown;
  try {
    parsed = JSON.parse(detail);
  } catch {
    return null;
  }
  const { seal }: { seal?: Partial<Seal> | null } = parsed !== null && typeof parsed === 'object' ? parsed : {};
  if (!seal || typeof seal !== 'object') return null;
  const { final, settlements, settled, locks, locked, marks } = seal;
  const isWhole =
    [final, settled, locked, marks].every((hash) => typeof hash === 'string') &&
    [settlements, locks].every((count) => typeof count === 'number');
  return isWhole ? (seal as Seal) : null;
}
