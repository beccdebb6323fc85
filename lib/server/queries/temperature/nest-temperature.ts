import 'server-only';
import type { FilledRange, HeatWarning } from '@/lib/brood/temperature/clock-parts';
import { type DaySummary, daySummaries } from '@/lib/brood/temperature/day-summary';
import { type DevelopmentClock, developmentClock } from '@/lib/brood/temperature/development-clock';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';
import { durationsFor } from '@/lib/brood/durations';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { teamBroodSettings } from '@/lib/server/queries/brood-settings';
import { type NameOf, memberNames } from '@/lib/server/queries/member-names';
import { nestById } from '@/lib/server/queries/nest-rows';
import { teamScope } from '@/lib/server/queries/team-scope';
import { nestRecord } from './nest-record';
import { type TemperatureRow, temperaturesOf } from './temperature-rows';

/** One file or list of days that was kept for a nest. */
export interface KeptTemperature {
  id: string;
  kind: 'logger' | 'daily';
  source: 'file' | 'hand';
  fileName: string | null;
  /** SHA-256 of the text as it came, hexadecimal. */
  hash: string;
  /** Readings or days in it. */
  size: number;
  /** UTC instants. */
  from: string;
  to: string;
  keptBy: string;
  keptAt: string;
  /** Who took it out of force, when and why; null while it counts. */
  removed: { by: string; at: string; reason: string } | null;
}

/** The answer of `GET /api/nests/<id>/temperature`. */
export interface NestTemperature {
  kind: DevelopmentClock['kind'];
  zone: string;
  /** °C above which a warning is given. */
  limitC: number;
  /** °C at which a day counts as one day. */
  referenceC: number;
  days: DaySummary[];
  filled: { from: string; to: string; how: FilledRange['how'] }[];
  warnings: HeatWarning[];
  records: KeptTemperature[];
}

const instantText = (epochMs: number): string => new Date(epochMs).toISOString();

function removal(
  { removed_at, removed_by, removed_reason }: TemperatureRow,
  nameOf: NameOf,
): KeptTemperature['removed'] {
  if (!removed_at) return null;
  return { by: removed_by ? nameOf(removed_by) : '', at: removed_at.toISOString(), reason: removed_reason ?? '' };
}

function presentKept(row: TemperatureRow, nameOf: NameOf): KeptTemperature {
  const { kind, source, size } = row;
  return {
    id: fromBinary(row.id),
    ...{ kind, source, size },
    fileName: row.file_name,
    hash: row.raw_hash.toString('hex'),
    from: row.from_at.toISOString(),
    to: row.to_at.toISOString(),
    keptBy: nameOf(row.kept_by),
    keptAt: row.kept_at.toISOString(),
    removed: removal(row, nameOf),
  };
}

/**
 * `GET /api/nests/<id>/temperature`: what was measured, day by day, what was filled, and every record kept.
 *
 * @throws HttpProblem `not-found` for an unknown nest or another team's.
 */
export async function nestTemperature(ctx: TeamContext, id: string): Promise<NestTemperature> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  const { settings } = await teamBroodSettings(scope);
  const { record, place } = await nestRecord(scope, nest);
  const { referenceC } = durationsFor(nest.taxon, settings.durations).row;
  const heat = temperatureSettings(settings.values, referenceC);
  const clock = developmentClock(record, heat, { zone: ctx.zone, place });
  const nameOf = await memberNames(scope);
  return {
    kind: clock.kind,
    zone: ctx.zone,
    limitC: heat.limit,
    referenceC,
    days: record ? daySummaries(record, clock, ctx.zone) : [],
    filled: clock.filled.map(({ from, to, how }) => ({ from: instantText(from), to: instantText(to), how })),
    warnings: [...clock.warnings],
    records: (await temperaturesOf(scope, nest.id)).map((row) => presentKept(row, nameOf)),
  };
}
