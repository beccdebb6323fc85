import { compareMarks } from '@/lib/comb/live-marks';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import type { LocalOp } from './local-op';
import type { FieldView } from './nest-view';

/** The entity that a register operation is about: a word points into the envelope. */
export function entityOf({ body, nest, visit, reading }: Op): string | null {
  switch (body.entity) {
    case 'nest':
      return nest;
    case 'visit':
      return visit;
    case 'reading':
      return reading;
    default:
      return typeof body.entity === 'string' ? body.entity : null;
  }
}

/** The operations that an edit was made from. */
function basesOf(base: Json | undefined): Json[] {
  return Array.isArray(base) ? base : [base ?? null];
}

/** The current view of one register: the newest value that nobody has edited further, and the other such values. */
function foldRegister(ops: readonly Op[], valueOf: (op: Op) => Json): FieldView | null {
  const edited = new Set(ops.flatMap((op) => basesOf(op.body.base)));
  const heads = ops.filter((op) => !edited.has(op.opId)).sort((a, b) => compareMarks(b, a));
  const [winner, ...others] = heads.map((op) => ({ opId: op.opId, value: valueOf(op) }));
  return winner ? { ...winner, others } : null;
}

/** The winning values of an entity's fields, by field name. */
export function foldFields(rows: readonly LocalOp[], entity: string): Map<string, FieldView> {
  const byField = new Map<string, Op[]>();
  for (const { op, kind } of rows) {
    if (kind !== 'field.set' || entityOf(op) !== entity) continue;
    const field = String(op.body.field);
    byField.set(field, [...(byField.get(field) ?? []), op]);
  }
  const fields = new Map<string, FieldView>();
  for (const [field, ops] of byField) {
    const view = foldRegister(ops, (op) => op.body.value ?? null);
    if (view) fields.set(field, view);
  }
  return fields;
}

/** The winning note of an entity. */
export function foldNote(rows: readonly LocalOp[], entity: string): FieldView | null {
  const ops = rows.filter(({ kind, op }) => kind === 'note.set' && entityOf(op) === entity).map(({ op }) => op);
  return foldRegister(ops, (op) => op.body.text ?? '');
}
