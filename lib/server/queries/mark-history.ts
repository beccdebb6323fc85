import 'server-only';
import type { InferAttributes } from 'sequelize';
import { liveMarks } from '@/lib/comb/live-marks';
import type { Mark as CombMark } from '@/lib/comb/mark';
import { type CellState, isCellState } from '@/lib/comb/states';
import { fromBinary, fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { Mark } from '@/models/mark';
import { idKey } from './id-key';
import type { TeamScope } from './team-scope';

/** A mark with its place in the team's log. */
export interface LoggedMark extends CombMark {
  seq: number;
}

/** Everything ever marked and taken back in one reading. */
export interface MarkHistory {
  marks: LoggedMark[];
  /** Retracted mark and the place of its retraction in the log. */
  retractions: { target: string; seq: number }[];
}

/** A stored state word. @throws when the database holds a word this version does not know. */
export function storedState(word: string): CellState {
  if (!isCellState(word)) throw new Error('a stored cell state is not one of the twelve');
  return word;
}

function loggedMark(row: InferAttributes<Mark>): LoggedMark {
  const { seq, q, r, instar, note, hlc } = row;
  const flags = {
    nectar: Boolean(row.nectar),
    unsure: Boolean(row.unsure),
    reused: Boolean(row.reused),
    scrap: Boolean(row.scrap),
  };
  const ids = { opId: fromBinary(row.op_id), supersedes: fromBinaryOrNull(row.supersedes) };
  return { seq, q, r, state: storedState(row.state), ...flags, instar, note, ...ids, hlc, at: row.at_text };
}

/** The history of some readings by `idKey`; readings that somebody marked in, not final ones. */
export async function markHistories(scope: TeamScope, readings: readonly Buffer[]): Promise<Map<string, MarkHistory>> {
  const histories = new Map(readings.map((id) => [idKey(id), { marks: [], retractions: [] } as MarkHistory]));
  if (histories.size === 0) return histories;
  const find = {
    where: { team_id: scope.team, reading_id: [...readings] },
    raw: true,
    transaction: scope.transaction,
  } as const;
  for (const row of await scope.db.models.Mark.findAll(find)) {
    histories.get(idKey(row.reading_id))?.marks.push(loggedMark(row));
  }
  for (const row of await scope.db.models.Retraction.findAll(find)) {
    histories.get(idKey(row.reading_id))?.retractions.push({ target: fromBinary(row.target), seq: row.seq });
  }
  return histories;
}

/**
 * The live marks of a history as they stood at a place in the log.
 *
 * @param upTo the last `seq` that counts; null for all.
 */
export function liveUpTo({ marks, retractions }: MarkHistory, upTo: number | null): CombMark[] {
  const counts = ({ seq }: { seq: number }) => upTo === null || seq <= upTo;
  return liveMarks(marks.filter(counts), new Set(retractions.filter(counts).map(({ target }) => target)));
}
