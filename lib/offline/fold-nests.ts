import type { Json } from '@/lib/protocol/canonical-json';
import { entityOf, foldFields, foldNote } from './fold-fields';
import { foldVisits } from './fold-visits';
import type { LocalOp } from './local-op';
import type { FieldView, NestSummary, NestView, Place } from './nest-view';
import { distinctOps, standingOf, worstStanding } from './op-standing';

/** The kinds that nests, visits and readings are folded from; marks are folded with their reading. */
export const OUTLINE_KINDS = [
  'nest.open',
  'visit.open',
  'reading.open',
  'reading.submit',
  'field.set',
  'note.set',
  'entity.archive',
] as const;

function textOrNull(value: Json): string | null {
  return typeof value === 'string' && value !== '' ? value : null;
}

function placeOrNull(value: Json): Place | null {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return null;
  const { lat, lon, accuracyM } = value;
  if (typeof lat !== 'number' || typeof lon !== 'number') return null;
  return { lat, lon, accuracyM: typeof accuracyM === 'number' ? accuracyM : null };
}

function isArchived(rows: readonly LocalOp[], nest: string): boolean {
  return rows.some(({ kind, op }) => kind === 'entity.archive' && entityOf(op) === nest);
}

/** One nest from the operations about it. */
function nestOf(opening: LocalOp, rows: readonly LocalOp[], me: string): NestView | null {
  const { nest, op } = opening;
  if (!nest) return null;
  const fields: ReadonlyMap<string, FieldView> = foldFields(rows, nest);
  // A field that was set later, even to nothing, stands before what the nest was opened with.
  const current = (field: string): Json =>
    fields.has(field) ? (fields.get(field)?.value ?? null) : (op.body[field] ?? null);
  const visitList = foldVisits(rows, me);
  const readings = visitList.flatMap((visit) => visit.readings);
  return {
    id: nest,
    code: textOrNull(current('code')) ?? '',
    name: textOrNull(current('name')),
    taxon: textOrNull(current('taxon')),
    place: placeOrNull(current('place')),
    openedAt: op.at.wall,
    visits: visitList.length,
    lastVisitAt: visitList.at(-1)?.startedAt ?? null,
    lastReadingId: readings.at(-1)?.id ?? null,
    archived: isArchived(rows, nest),
    standing: worstStanding(rows),
    waiting: rows.filter((row) => standingOf(row) === 'waiting').length,
    fields,
    note: foldNote(rows, nest),
    visitList,
  };
}

function byNest(rows: readonly LocalOp[]): Map<string, LocalOp[]> {
  const groups = new Map<string, LocalOp[]>();
  for (const row of rows) {
    if (row.nest === null) continue;
    const group = groups.get(row.nest);
    if (group) group.push(row);
    else groups.set(row.nest, [row]);
  }
  return groups;
}

/** The later of a nest's last visit and its opening, in epoch milliseconds. */
function lastTouched({ lastVisitAt, openedAt }: NestSummary): number {
  return Date.parse(lastVisitAt ?? openedAt) || 0;
}

/**
 * The nests among these operations with their visits and readings, the latest visited first.
 *
 * @param rows operations of `OUTLINE_KINDS`, and any others that should count as waiting.
 * @param me the user id of the person who looks.
 */
export function foldNests(rows: readonly LocalOp[], me: string): NestView[] {
  const groups = byNest(rows);
  return distinctOps(rows)
    .filter((row) => row.kind === 'nest.open')
    .map((row) => nestOf(row, groups.get(row.nest ?? '') ?? [], me))
    .filter((nest) => nest !== null)
    .sort((a, b) => lastTouched(b) - lastTouched(a) || (a.code < b.code ? -1 : 1));
}
