import { v7 } from 'uuid';
import type { CellState } from '@/lib/comb/states';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';
import { wireOp } from '@/tests/support/wire/wire-op';
import type { TestTeam } from './make-team';

/** What a test says about one mark. */
export interface MarkInput {
  q: number;
  r: number;
  state: CellState;
  opId?: string;
  nectar?: boolean;
  unsure?: boolean;
  reused?: boolean;
  scrap?: boolean;
  instar?: number | null;
  note?: string | null;
  supersedes?: string | null;
  at?: string;
}

/** What a test says about a reading. */
export interface ReadingInput {
  nest: string;
  visit: string;
  id?: string;
  kind?: 'field' | 'second';
  /** User id; the team's technician for a field reading, its reviewer for a second one. */
  by?: string;
  openedAt?: string;
  submittedAt?: string | null;
  aid?: string | null;
  marks?: readonly MarkInput[];
}

/** Takes the next `count` places of a team's log; returns the first. */
async function takeSeqs(team: TestTeam, count: number): Promise<number> {
  const where = { team_id: toBinary(team.teamId) };
  const counter = await database().models.TeamCounter.findOne({ where, rejectOnEmpty: true });
  await counter.update({ seq: counter.seq + count });
  return counter.seq - count + 1;
}

/** The log's rows for marks or retractions of a reading; returns the place of the first. */
async function logRows(team: TestTeam, reading: string, ops: readonly Op[]): Promise<number> {
  const first = await takeSeqs(team, ops.length);
  const rows = ops.map((op, index) => ({
    team_id: toBinary(team.teamId),
    op_id: toBinary(op.opId),
    seq: first + index,
    kind: op.kind,
    nest_id: null,
    visit_id: null,
    reading_id: toBinary(reading),
    actor_id: toBinary(team.members.technician.userId),
    device_id: null,
    hlc: `1781602867120.${first + index}`,
    op: JSON.stringify(op),
    body_hash: Buffer.from(op.bodyHash, 'hex'),
    flags: '',
    received_at: new Date('2026-06-16T12:00:00Z'),
  }));
  await database().models.Op.bulkCreate(rows);
  return first;
}

/** Puts marks into a reading, in order of their clocks; returns their operation ids. */
export async function makeMarks(team: TestTeam, reading: string, marks: readonly MarkInput[]): Promise<string[]> {
  const ids = marks.map((mark) => mark.opId ?? v7());
  const ops = marks.map(({ opId: _, at: __, ...body }, index) =>
    wireOp({ kind: 'cell.mark', opId: ids[index], reading, body }),
  );
  const first = await logRows(team, reading, ops);
  await database().models.Mark.bulkCreate(
    marks.map((mark, index) => ({
      team_id: toBinary(team.teamId),
      op_id: toBinary(ids[index] ?? ''),
      reading_id: toBinary(reading),
      seq: first + index,
      q: mark.q,
      r: mark.r,
      state: mark.state,
      nectar: mark.nectar ?? false,
      unsure: mark.unsure ?? false,
      reused: mark.reused ?? false,
      scrap: mark.scrap ?? false,
      instar: mark.instar ?? null,
      note: mark.note ?? null,
      supersedes: toBinaryOrNull(mark.supersedes),
      hlc: `1781602867120.${first + index}`,
      at_text: mark.at ?? '2026-06-16T05:41:07.120-04:00',
    })),
  );
  return ids;
}

/** Takes a mark back. */
export async function makeRetraction(team: TestTeam, reading: string, target: string): Promise<void> {
  const opId = v7();
  const seq = await logRows(team, reading, [wireOp({ kind: 'cell.retract', opId, reading, body: { target } })]);
  await database().models.Retraction.create({
    team_id: toBinary(team.teamId),
    op_id: toBinary(opId),
    reading_id: toBinary(reading),
    target: toBinary(target),
    seq,
  });
}

/** Puts a field or second reading with its marks at a visit and returns its id. */
export async function makeReading(team: TestTeam, input: ReadingInput): Promise<string> {
  const { id = v7(), kind = 'field', marks = [], openedAt = '2026-06-16T05:40:00.000-04:00' } = input;
  const { technician, reviewer } = team.members;
  const submittedAt = input.submittedAt === undefined ? '2026-06-16T10:00:00Z' : input.submittedAt;
  await database().models.Reading.create({
    team_id: toBinary(team.teamId),
    id: toBinary(id),
    nest_id: toBinary(input.nest),
    visit_id: toBinary(input.visit),
    kind,
    source: kind === 'field' ? 'phone' : 'photo',
    aid: input.aid ?? null,
    light: null,
    opened_by: toBinary(input.by ?? (kind === 'field' ? technician : reviewer).userId),
    opened_at: new Date(openedAt),
    opened_at_text: openedAt,
    submitted_at: submittedAt === null ? null : new Date(submittedAt),
    based_on: null,
    base_seq: null,
    version: null,
    locked_version: null,
  });
  if (marks.length > 0) await makeMarks(team, id, marks);
  return id;
}
