import 'server-only';
import type { FileAnswers, FileLayout, FileQuestion } from '@/lib/brood/temperature/csv/layout';
import type { FileNote } from '@/lib/brood/temperature/csv/file-note';
import { parseTemperatureCsv, recordSize } from '@/lib/brood/temperature/csv/parse-temperature-csv';
import { developmentClock } from '@/lib/brood/temperature/development-clock';
import { loggerGaps } from '@/lib/brood/temperature/logger-curve';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';
import { durationsFor } from '@/lib/brood/durations';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { teamBroodSettings } from '@/lib/server/queries/brood-settings';
import { nestById } from '@/lib/server/queries/nest-rows';
import { teamScope } from '@/lib/server/queries/team-scope';

/** Notes shown one by one; the rest are counted. */
const SHOWN_NOTES = 50;

/** What a file was recognised as, before anything is kept. */
export type TemperaturePreview =
  | { kind: 'unreadable'; reason: string }
  | { kind: 'questions'; questions: FileQuestion[] }
  | {
      kind: 'read';
      layout: FileLayout;
      /** Readings or days. */
      count: number;
      /** UTC instants for a logger, local dates for days. */
      from: string;
      to: string;
      /** Lowest and highest of all, °C. */
      lowest: number;
      highest: number;
      gaps: number;
      notes: FileNote[];
      /** All notes, those not shown included. */
      noteCounts: Partial<Record<FileNote['code'], number>>;
      warnings: string[];
    };

function ends(record: TemperatureRecord): { from: string; to: string } {
  if (record.kind === 'daily') return { from: record.days[0]?.date ?? '', to: record.days.at(-1)?.date ?? '' };
  const [from = 0, to = 0] = [record.readings[0]?.at, record.readings.at(-1)?.at];
  return { from: new Date(from).toISOString(), to: new Date(to).toISOString() };
}

function extremes(record: TemperatureRecord): { lowest: number; highest: number } {
  const values =
    record.kind === 'logger'
      ? record.readings.map(({ celsius }) => [celsius, celsius] as const)
      : record.days.map(({ min, max }) => [min, max] as const);
  return {
    lowest: values.reduce((best, [min]) => Math.min(best, min), Infinity),
    highest: values.reduce((best, [, max]) => Math.max(best, max), -Infinity),
  };
}

function countNotes(notes: readonly FileNote[]): Partial<Record<FileNote['code'], number>> {
  const counts: Partial<Record<FileNote['code'], number>> = {};
  for (const { code } of notes) counts[code] = (counts[code] ?? 0) + 1;
  return counts;
}

/**
 * `POST /api/nests/<id>/temperature/preview`: what a file is recognised as. Nothing is kept.
 *
 * @throws HttpProblem `not-found` for an unknown nest or another team's.
 */
export async function previewTemperature(
  ctx: TeamContext,
  id: string,
  { text, answers }: { text: string; answers?: FileAnswers },
): Promise<TemperaturePreview> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  const parsed = parseTemperatureCsv(text, ctx.zone, answers);
  if (parsed.kind !== 'read') return parsed;
  const { settings } = await teamBroodSettings(scope);
  const { record, layout, notes } = parsed;
  const heat = temperatureSettings(settings.values, durationsFor(nest.taxon, settings.durations).row.referenceC);
  const place = nest.lat === null || nest.lon === null ? null : { lat: nest.lat, lon: nest.lon };
  const clock = developmentClock(record, heat, { zone: ctx.zone, place });
  return {
    kind: 'read',
    layout,
    count: recordSize(record),
    ...ends(record),
    ...extremes(record),
    gaps: record.kind === 'logger' ? loggerGaps(record.readings).length : clock.filled.length,
    notes: notes.slice(0, SHOWN_NOTES),
    noteCounts: countNotes(notes),
    warnings: clock.warnings.filter(({ code }) => code !== 'no-place').map((warning) => warning.text),
  };
}
