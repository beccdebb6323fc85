import 'server-only';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { PrimaryChoiceRow } from './primary-choices';

/** The readings of one visit by the part they play in its review. */
export interface VisitReadings {
  /** Field readings handed in, in the order they were opened: two phones, or a paper sheet typed in. */
  fields: ReadingRow[];
  /** The field reading that counts: the one chosen, else the first handed in. Null before any is. */
  primary: ReadingRow | null;
  /** Were there several, and somebody said which counts? */
  choice: PrimaryChoiceRow | null;
  /** The latest second reading handed in. */
  second: ReadingRow | null;
  /** Second readings not handed in yet. */
  openSeconds: ReadingRow[];
  /** The final reading made from the primary one. */
  final: ReadingRow | null;
}

function bySubmission(a: ReadingRow, b: ReadingRow): number {
  return (a.submitted_at?.getTime() ?? 0) - (b.submitted_at?.getTime() ?? 0);
}

/** Sorts out the readings of one visit. */
export function visitReadings(readings: readonly ReadingRow[], choice: PrimaryChoiceRow | null): VisitReadings {
  const fields = readings.filter(({ kind, submitted_at }) => kind === 'field' && submitted_at !== null);
  const seconds = readings.filter(({ kind }) => kind === 'second');
  const chosen = choice && fields.find(({ id }) => id.equals(choice.reading_id));
  const primary = chosen ?? [...fields].sort(bySubmission)[0] ?? null;
  return {
    fields,
    primary,
    choice,
    second:
      seconds
        .filter(({ submitted_at }) => submitted_at !== null)
        .sort(bySubmission)
        .at(-1) ?? null,
    openSeconds: seconds.filter(({ submitted_at }) => submitted_at === null),
    final: readings.find(({ based_on }) => primary !== null && based_on?.equals(primary.id)) ?? null,
  };
}
