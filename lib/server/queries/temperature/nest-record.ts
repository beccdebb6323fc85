import 'server-only';
import { createHash } from 'node:crypto';
import { mergeRecords } from '@/lib/brood/temperature/merge-records';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import type { Place } from '@/lib/brood/temperature/sun-times';
import type { NestRow } from '@/lib/server/queries/nest-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import { storedRecord, temperaturesOf } from './temperature-rows';

/** What is known of a nest's temperature now. */
export interface NestRecord {
  record: TemperatureRecord | null;
  /** Where the sun is taken from: the nest, or the team's home where no place was recorded. */
  place: Place | null;
  /** Changes whenever anything in `record` or `place` does. */
  digest: string;
}

async function placeOf({ team, db, transaction }: TeamScope, { lat, lon }: NestRow): Promise<Place | null> {
  if (lat !== null && lon !== null) return { lat, lon };
  const home = await db.models.Team.findByPk(team, { raw: true, transaction });
  return home?.home_lat != null && home.home_lon !== null ? { lat: home.home_lat, lon: home.home_lon } : null;
}

/** All records of a nest that are in force, put together. */
export async function nestRecord(scope: TeamScope, nest: NestRow): Promise<NestRecord> {
  const rows = (await temperaturesOf(scope, nest.id)).filter(({ removed_at }) => removed_at === null);
  if (rows.length === 0) return { record: null, place: null, digest: '' };
  const record = mergeRecords(await Promise.all(rows.map((row) => storedRecord(scope, row))));
  const place = await placeOf(scope, nest);
  const digest = createHash('sha256')
    .update(JSON.stringify([record, place]))
    .digest('hex');
  return { record, place, digest };
}
