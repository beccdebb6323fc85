import type { z } from 'zod';
import { isAddress } from '@/lib/comb/axial';
import type { Json } from './canonical-json';
import { checkTime } from './check-time';
import { checkFieldValue } from './entity-fields';
import { entityOf } from './entity-of';
import type { Op, OpKind } from './op';
import { OP_BODIES } from './op-bodies';
import type { OpCode } from './op-codes';

/** The part of an operation that its body is judged with. */
type Bodied = Pick<Op, 'nest' | 'visit' | 'reading' | 'body'>;

/** Members that hold an id. */
const ID_MEMBERS: ReadonlySet<unknown> = new Set(['target', 'supersedes', 'photoId', 'entity', 'base']);

/** The code that is told when a body has several faults: the first of this list. */
const BY_WEIGHT: readonly OpCode[] = ['unknown-field', 'cell', 'value', 'too-long', 'place', 'id'];

/** The messages of an issue and of every branch of a union that failed. */
function messagesOf(issue: z.core.$ZodIssue): string[] {
  const inner = issue.code === 'invalid_union' ? issue.errors.flat().flatMap(messagesOf) : [];
  return [issue.message, ...inner];
}

function codeOfIssue(issue: z.core.$ZodIssue): OpCode {
  const [member] = issue.path;
  if (issue.code === 'unrecognized_keys') return 'unknown-field';
  if (member === 'q' || member === 'r' || member === 'cell') return 'cell';
  if (messagesOf(issue).includes('too-long')) return 'too-long';
  if (member === 'place') return 'place';
  return ID_MEMBERS.has(member) ? 'id' : 'value';
}

function isOffComb(cell: Json | undefined): boolean {
  if (cell === null || cell === undefined) return false;
  return typeof cell !== 'object' || Array.isArray(cell) || !isAddress(cell.q, cell.r);
}

function checkField(op: Bodied): OpCode | null {
  const entity = entityOf(op);
  const { field, value } = op.body;
  return entity && typeof field === 'string' ? checkFieldValue(entity.type, field, value ?? null) : null;
}

/** What the schema of a kind cannot say. */
const FURTHER: Partial<Record<OpKind, (op: Bodied) => OpCode | null>> = {
  'cell.mark': ({ body }) => (isOffComb(body) ? 'cell' : null),
  'photo.attach': ({ body }) => (isOffComb(body.cell) ? 'cell' : null),
  'visit.open': ({ body }) => checkTime(String(body.startedAt)),
  'field.set': checkField,
};

/** Checks a body against its kind: members, types, ranges, lengths. */
export function checkBody(kind: OpKind, op: Bodied): OpCode | null {
  const parsed = OP_BODIES[kind].safeParse(op.body);
  const further = FURTHER[kind]?.(op) ?? null;
  if (parsed.success) return further;
  // The schema knows a field's value only roughly; what its own schema said is more exact.
  const issues = further ? parsed.error.issues.filter((issue) => issue.path[0] !== 'value') : parsed.error.issues;
  const codes = new Set([...issues.map(codeOfIssue), further]);
  return BY_WEIGHT.find((code) => codes.has(code)) ?? 'value';
}
