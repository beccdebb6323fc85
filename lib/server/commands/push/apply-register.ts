import 'server-only';
import type { Json } from '@/lib/protocol/canonical-json';
import { fieldSchema } from '@/lib/protocol/entity-fields';
import { type EntityRef, entityOf } from '@/lib/protocol/entity-of';
import { placeOf } from '@/lib/protocol/op-flags';
import { registerWinner } from '@/lib/protocol/register';
import { registerOf, registerSetOf } from '@/lib/protocol/register-of';
import { type Application, instantOf } from './application';
import { noteChange } from './writes';

/** The columns of a nest that a field sets. */
function nestColumns(field: string, value: Json) {
  if (field !== 'place') return { [field]: value };
  const place = placeOf(value);
  return { lat: place?.lat ?? null, lon: place?.lon ?? null, accuracy_m: place?.accuracyM ?? null };
}

/** The columns of a visit that a field sets. */
function visitColumns(field: string, value: Json) {
  return field === 'startedAt'
    ? { started_at: instantOf(String(value)), started_at_text: String(value) }
    : { [field]: value };
}

/** Shows the winning value on the entity's row. A field without a column of its own is only kept. */
function project({ writes }: Application, { type, id }: EntityRef, shown: { field: string; value: Json }): void {
  const { field, value } = shown;
  if (!fieldSchema(type, field)) return;
  if (type === 'nest') noteChange(writes.nestChanges, id, nestColumns(field, value));
  else if (type === 'visit') noteChange(writes.visitChanges, id, visitColumns(field, value));
  else noteChange(writes.readingChanges, id, { [field]: value });
}

/** `field.set` and `note.set`: one more setting of a register; all settings are kept, the winner is shown. */
export function applyRegister(application: Application): void {
  const { world, op } = application;
  const register = registerOf(op);
  const entity = entityOf(op);
  if (register === null || !entity) return;
  const sets = [...(world.registers.get(register) ?? []), registerSetOf(op)];
  world.registers.set(register, sets);
  const winner = registerWinner(sets);
  if (op.kind === 'field.set' && winner)
    project(application, entity, { field: String(op.body.field), value: winner.value });
}
