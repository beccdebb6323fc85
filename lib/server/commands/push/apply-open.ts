import 'server-only';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type Application, bodyOf, idOf, instantOf } from './application';

/** `nest.open`: a new nest. */
export function applyNestOpen({ team, world, writes, op, by }: Application): void {
  const nest = idOf(op.nest);
  const { code, name, taxon, place } = bodyOf('nest.open', op);
  world.nests.set(nest, { archived: false });
  writes.nests.push({
    team_id: team,
    id: toBinary(nest),
    code,
    name: name ?? null,
    taxon: taxon ?? null,
    lat: place?.lat ?? null,
    lon: place?.lon ?? null,
    accuracy_m: place?.accuracyM ?? null,
    opened_by: toBinary(by.userId),
    opened_at: instantOf(op.at.wall),
    opened_at_text: op.at.wall,
    archived_at: null,
  });
}

/** `visit.open`: a new visit to a nest. */
export function applyVisitOpen({ team, world, writes, op, by }: Application): void {
  const [nest, visit] = [idOf(op.nest), idOf(op.visit)];
  const { purpose, startedAt } = bodyOf('visit.open', op);
  world.visits.set(visit, { nest, archived: false });
  writes.visits.push({
    team_id: team,
    id: toBinary(visit),
    nest_id: toBinary(nest),
    purpose,
    started_at: instantOf(startedAt),
    started_at_text: startedAt,
    opened_by: toBinary(by.userId),
    archived_at: null,
  });
}

/** `reading.open`: a new reading, which only its opener may record in. */
export function applyReadingOpen({ team, world, writes, op, by }: Application): void {
  const [visit, reading] = [idOf(op.visit), idOf(op.reading)];
  const nest = idOf(world.visits.get(visit)?.nest);
  const { kind, source, aid, light } = bodyOf('reading.open', op);
  world.readings.set(reading, { nest, visit, kind, openedBy: by.userId, submitted: false, locked: false });
  writes.readings.push({
    team_id: team,
    id: toBinary(reading),
    nest_id: toBinary(nest),
    visit_id: toBinary(visit),
    kind,
    source,
    aid: aid ?? null,
    light: light ?? null,
    opened_by: toBinary(by.userId),
    opened_at: instantOf(op.at.wall),
    opened_at_text: op.at.wall,
    submitted_at: null,
    based_on: null,
    base_seq: null,
    version: null,
    locked_version: null,
  });
}
