import { v7 } from 'uuid';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { TestTeam } from './make-team';

/** What a test says about a nest; the rest is filled in. */
export interface NestInput {
  id?: string;
  code?: string;
  name?: string | null;
  taxon?: string | null;
  place?: { lat: number; lon: number; accuracyM?: number | null } | null;
  openedAt?: string;
  archivedAt?: string | null;
}

/** Puts a nest into a team and returns its id. */
export async function makeNest(team: TestTeam, input: NestInput = {}): Promise<string> {
  const { id = v7(), code = 'N01', name = null, taxon = 'Polistes fuscatus', place = null, archivedAt = null } = input;
  const openedAt = input.openedAt ?? '2026-06-14T09:00:00.000-04:00';
  await database().models.Nest.create({
    team_id: toBinary(team.teamId),
    id: toBinary(id),
    code,
    name,
    taxon,
    lat: place?.lat ?? null,
    lon: place?.lon ?? null,
    accuracy_m: place?.accuracyM ?? null,
    opened_by: toBinary(team.members.technician.userId),
    opened_at: new Date(openedAt),
    opened_at_text: openedAt,
    archived_at: archivedAt === null ? null : new Date(archivedAt),
  });
  return id;
}

/** What a test says about a visit. */
export interface VisitInput {
  id?: string;
  purpose?: string;
  startedAt?: string;
  archivedAt?: string | null;
}

/** Puts a visit to a nest and returns its id. */
export async function makeVisit(team: TestTeam, nest: string, input: VisitInput = {}): Promise<string> {
  const { id = v7(), purpose = 'take-down', startedAt = '2026-06-16T05:35:00.000-04:00', archivedAt = null } = input;
  await database().models.Visit.create({
    team_id: toBinary(team.teamId),
    id: toBinary(id),
    nest_id: toBinary(nest),
    purpose,
    started_at: new Date(startedAt),
    started_at_text: startedAt,
    opened_by: toBinary(team.members.technician.userId),
    archived_at: archivedAt === null ? null : new Date(archivedAt),
  });
  return id;
}
