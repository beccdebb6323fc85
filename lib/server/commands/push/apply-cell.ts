import 'server-only';
import { toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';
import { type Application, bodyOf, idOf, instantOf } from './application';
import { noteChange } from './writes';

/** `cell.mark`: one observation of one cell, never overwritten. */
export function applyCellMark({ team, writes, op, seq }: Application): void {
  const { q, r, state, nectar, unsure, reused, scrap, instar, note, supersedes } = bodyOf('cell.mark', op);
  writes.marks.push({
    team_id: team,
    op_id: toBinary(op.opId),
    reading_id: toBinary(idOf(op.reading)),
    seq,
    q,
    r,
    state,
    nectar,
    unsure,
    reused: reused ?? false,
    scrap: scrap ?? false,
    instar: instar ?? null,
    note: note ?? null,
    supersedes: toBinaryOrNull(supersedes),
    hlc: op.hlc,
    at_text: op.at.wall,
  });
}

/** `cell.retract`: takes a mark back; the mark itself stays. */
export function applyCellRetract({ team, world, writes, op, seq }: Application): void {
  const { target } = bodyOf('cell.retract', op);
  world.retracted.add(target);
  writes.retractions.push({
    team_id: team,
    op_id: toBinary(op.opId),
    reading_id: toBinary(idOf(op.reading)),
    target: toBinary(target),
    seq,
  });
}

/** `reading.submit`: the reading is handed in; handing it in again changes nothing. */
export function applyReadingSubmit({ world, writes, op }: Application): void {
  const id = idOf(op.reading);
  const reading = world.readings.get(id);
  if (!reading || reading.submitted) return;
  world.readings.set(id, { ...reading, submitted: true });
  noteChange(writes.readingChanges, id, { submitted_at: instantOf(op.at.wall) });
}
