import type { Axial } from '@/lib/comb/axial';
import { type CellState, STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { Op } from '@/lib/protocol/op';
import { markOfOp } from './mark-of-op';

/** What a press says: "Cell 13: egg". */
export function markWords(cell: Axial & { state: CellState }): string {
  return `Cell ${cellNumber(cell)}: ${STATE_WORDS[cell.state]}`;
}

/** What undo would bring back: "Cell 13 was unread". */
export function undoWords(cell: Axial, before: CellState | null): string {
  return `Cell ${cellNumber(cell)} was ${STATE_WORDS[before ?? 'unread']}`;
}

/** What undo has brought back: "Cell 13 is unread again". */
export function undoneWords(cell: Axial, now: CellState | null): string {
  return `Cell ${cellNumber(cell)} is ${STATE_WORDS[now ?? 'unread']} again`;
}

/** What skipping says: "No cell at 13". */
export function skipWords(cell: Axial): string {
  return `No cell at ${cellNumber(cell)}`;
}

const KIND_WORDS: Readonly<Record<string, string>> = {
  'nest.open': 'Nest opened',
  'visit.open': 'Visit opened',
  'reading.open': 'Reading opened',
  'cell.mark': 'Cell marked',
  'cell.retract': 'Mark taken back',
  'reading.submit': 'Reading handed in',
  'field.set': 'Field changed',
  'note.set': 'Note written',
  'step.mark': 'Step timed',
  'behaviour.add': 'Behaviour noted',
  'sting.add': 'Sting noted',
  'photo.attach': 'Photo attached',
  'photo.detach': 'Photo removed',
  'entity.archive': 'Archived',
};

/** One operation in a list, in words. */
export function opWords(op: Pick<Op, 'kind' | 'opId' | 'hlc' | 'at' | 'body'>): string {
  const mark = op.kind === 'cell.mark' ? markOfOp(op) : null;
  if (mark) return markWords(mark);
  const words = KIND_WORDS[op.kind] ?? 'Something a newer version recorded';
  if (op.kind === 'nest.open') return `${words}: ${String(op.body.code)}`;
  return op.kind === 'field.set' ? `${words}: ${String(op.body.field)}` : words;
}
