import { foldFields, foldNote } from './fold-fields';
import { foldReadings } from './fold-readings';
import type { LocalOp } from './local-op';
import type { VisitView } from './nest-view';
import { distinctOps, worstStanding } from './op-standing';

const PURPOSES = ['take-down', 'check', 'lab', 'other'] as const;

function visitOf(opening: LocalOp, rows: readonly LocalOp[], me: string): VisitView | null {
  const { op, visit, nest, actor } = opening;
  if (!visit || !nest) return null;
  const own = rows.filter((row) => row.visit === visit);
  return {
    id: visit,
    nest,
    purpose: PURPOSES.find((purpose) => purpose === op.body.purpose) ?? 'other',
    startedAt: typeof op.body.startedAt === 'string' ? op.body.startedAt : op.at.wall,
    observer: actor,
    fields: foldFields(own, visit),
    note: foldNote(own, visit),
    readings: foldReadings(own, me),
    standing: worstStanding(own),
  };
}

/**
 * The visits among these operations, oldest first.
 *
 * @param me the user id of the person who looks.
 */
export function foldVisits(rows: readonly LocalOp[], me: string): VisitView[] {
  return distinctOps(rows)
    .filter((row) => row.kind === 'visit.open')
    .map((row) => visitOf(row, rows, me))
    .filter((visit) => visit !== null)
    .sort((a, b) => Date.parse(a.startedAt) - Date.parse(b.startedAt) || (a.id < b.id ? -1 : 1));
}
