import { cellKey } from '@/lib/comb/axial';
import { compareMarks, liveMarks } from '@/lib/comb/live-marks';
import type { Mark } from '@/lib/comb/mark';
import { emptyTally, tallyOf } from '@/lib/comb/tally';
import type { LocalOp } from './local-op';
import { markOfOp, targetOfOp } from './mark-of-op';
import type { MarkView, ReadingSummary, ReadingView, Standing } from './nest-view';
import { distinctOps, standingOf, worstStanding } from './op-standing';
import { markWords } from './op-words';

/** The marks of a reading, and which of them were taken back. */
export interface MarkHistory {
  marks: Mark[];
  retracted: Set<string>;
}

/** All marks and retractions among the operations of one reading. */
export function foldMarks(rows: readonly LocalOp[]): MarkHistory {
  const marks: Mark[] = [];
  const retracted = new Set<string>();
  for (const { op, kind } of distinctOps(rows)) {
    const mark = kind === 'cell.mark' ? markOfOp(op) : null;
    const target = kind === 'cell.retract' ? targetOfOp(op) : null;
    if (mark) marks.push(mark);
    if (target) retracted.add(target);
  }
  return { marks, retracted };
}

function oneOf<T extends string>(value: unknown, words: readonly [T, ...T[]]): T {
  return words.find((word) => word === value) ?? words[0];
}

function summaryOf(opening: LocalOp, rows: readonly LocalOp[], me: string): ReadingSummary | null {
  const { op, actor, reading, nest, visit } = opening;
  if (!reading || !nest || !visit) return null;
  const submitted = rows.filter((row) => row.kind === 'reading.submit' && row.reading === reading);
  submitted.sort((a, b) => compareMarks(a.op, b.op));
  return {
    id: reading,
    nest,
    visit,
    kind: oneOf(op.body.kind, ['field', 'second']),
    source: oneOf(op.body.source, ['phone', 'paper', 'photo']),
    observer: actor,
    mine: actor === me,
    openedAt: op.at.wall,
    submittedAt: submitted[0]?.op.at.wall ?? null,
    blind: false,
    standing: worstStanding(rows.filter((row) => row.reading === reading)),
  };
}

/** A person who reads a second time sees no other reading of the visit before handing in their own. */
function hidden(reading: ReadingSummary, all: readonly ReadingSummary[]): boolean {
  const blinding = (own: ReadingSummary) =>
    own.mine && own.kind === 'second' && own.submittedAt === null && own.visit === reading.visit;
  return !reading.mine && all.some(blinding);
}

/**
 * The readings among these operations, oldest first.
 *
 * @param rows at least the `reading.open` and `reading.submit` operations of whole visits.
 * @param me the user id of the person who looks.
 */
export function foldReadings(rows: readonly LocalOp[], me: string): ReadingSummary[] {
  const openings = distinctOps(rows).filter((row) => row.kind === 'reading.open');
  openings.sort((a, b) => compareMarks(a.op, b.op));
  const readings = openings.map((row) => summaryOf(row, rows, me)).filter((reading) => reading !== null);
  return readings.map((reading) => ({ ...reading, blind: hidden(reading, readings) }));
}

function historyOf(rows: readonly LocalOp[], marks: readonly Mark[]): ReadingView['history'] {
  const byId = new Map(marks.map((mark) => [mark.opId, mark]));
  const deeds = rows.filter(({ kind }) => kind === 'cell.mark' || kind === 'cell.retract');
  deeds.sort((a, b) => compareMarks(b.op, a.op));
  return deeds.flatMap(({ op }) => {
    const target = targetOfOp(op);
    const mark = byId.get(target ?? op.opId);
    if (!mark) return [];
    const words = target ? `${markWords(mark)}, taken back` : markWords(mark);
    return [{ opId: op.opId, words, at: op.at.wall }];
  });
}

/** One reading with its live marks, as the person who looks may see it. */
export function foldReading(summary: ReadingSummary, rows: readonly LocalOp[]): ReadingView {
  if (summary.blind) return { ...summary, marks: [], tally: emptyTally(), history: [] };
  const { marks, retracted } = foldMarks(rows);
  const standings = new Map(rows.map((row): [string, Standing] => [row.op.opId, standingOf(row)]));
  const live = liveMarks(marks, retracted);
  const views: MarkView[] = live.map((mark) => ({ ...mark, standing: standings.get(mark.opId) ?? 'at-office' }));
  const history = summary.mine ? historyOf(distinctOps(rows), marks) : [];
  return { ...summary, marks: views, tally: tallyOf(live), history, standing: worstStanding(rows) };
}

/** The live marks of a reading by cell. */
export function liveByCell({ marks, retracted }: MarkHistory): Map<string, Mark> {
  return new Map(liveMarks(marks, retracted).map((mark) => [cellKey(mark), mark]));
}
