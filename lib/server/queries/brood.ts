import 'server-only';
import { createHash } from 'node:crypto';
import type { BroodEstimate } from '@/lib/brood/answer';
import type { BroodReading } from '@/lib/brood/input';
import { groupBy } from '@/lib/kit/group-by';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { blindVisits, isHidden } from './blind-visits';
import { teamBroodSettings } from './brood-settings';
import { censusOf } from './census';
import { estimateAtHand } from './estimate-at-hand';
import { idKey } from './id-key';
import { type NestRow, nestById, visitsOfNests } from './nest-rows';
import { readingCells } from './reading-cells';
import { readingsOfNests } from './reading-rows';
import { chosenReadings } from './review/primary-choices';
import { type TeamScope, teamScope } from './team-scope';
import { nestRecord } from './temperature/nest-record';

/** An estimate with the number of the settings version behind it. */
export interface NestBrood {
  estimate: BroodEstimate;
  settingsVersion: number;
}

/** Shortens the input of an estimate to the digest it is stored under. */
function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** A digest of the input and, where there is one, of the temperature record behind it. */
function digestWith(temperature: string): (text: string) => string {
  return (text) => sha256(temperature === '' ? text : `${text}\n${temperature}`);
}

/**
 * One reading a visit, the one that speaks for it, dated by the visit's start: a photo is read weeks later, but the
 * brood is as old as it was at the nest. Archived visits and readings kept from the person who asks are left out.
 */
export async function broodReadings(scope: TeamScope, nest: Buffer): Promise<BroodReading[]> {
  const blind = await blindVisits(scope);
  const visible = (await readingsOfNests(scope, [nest])).filter((reading) => !isHidden(reading, scope, blind));
  const byVisit = groupBy(visible, (reading) => idKey(reading.visit_id));
  const visits = (await visitsOfNests(scope, [nest])).filter((visit) => visit.archived_at === null);
  const chosen = await chosenReadings(
    scope,
    visits.map((visit) => visit.id),
  );
  const censuses = visits.flatMap((visit) => {
    const census = censusOf(byVisit.get(idKey(visit.id)) ?? [], chosen);
    return census ? [{ census, at: visit.started_at.getTime() }] : [];
  });
  const cells = await readingCells(
    scope,
    censuses.map(({ census }) => census),
  );
  return censuses.map(({ census, at }) => ({
    id: fromBinary(census.id),
    at,
    marks: cells.get(idKey(census.id)) ?? [],
  }));
}

/** What an estimate of one nest is made from, but for the settings. */
export async function broodInput(scope: TeamScope, nest: NestRow, { zone, asOf }: { zone: string; asOf: number }) {
  const { record, place, digest } = await nestRecord(scope, nest);
  return {
    nest: fromBinary(nest.id),
    zone,
    asOf,
    readings: await broodReadings(scope, nest.id),
    taxon: nest.taxon,
    temperature: record,
    place,
    digest: digestWith(digest),
  };
}

/**
 * `GET /api/nests/<id>/brood`: when the brood of a nest was laid, is capped and comes out, as ranges.
 *
 * @param asOf epoch milliseconds; later visits are not looked at.
 * @throws HttpProblem `not-found` for an unknown nest or another team's.
 */
export async function nestBrood(ctx: TeamContext, id: string, asOf: number): Promise<NestBrood> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  const { version, settings } = await teamBroodSettings(scope);
  const input = await broodInput(scope, nest, { zone: ctx.zone, asOf });
  return { estimate: estimateAtHand(scope, { ...input, settings }), settingsVersion: version };
}
