import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { may } from '@/lib/server/policies/may';
import { type SeenPlace, seenPlace } from '@/lib/server/policies/seen-place';
import { teamScope } from './team-scope';

/** A release place and the person who offers it. */
export interface HostAnswer {
  id: string;
  code: string;
  name: string;
  placeName: string;
  place: SeenPlace | null;
  capacity: number;
  /** Notes about the host; null for people who only need the way there. */
  note: string | null;
  /** `YYYY-MM-DD` when the host took the offer back. */
  withdrawnOn: string | null;
}

/** The team's hosts by code. Notes about people are for those who may read about people. */
export async function hosts(ctx: TeamContext): Promise<{ hosts: HostAnswer[] }> {
  const { team, db } = teamScope(ctx);
  const rows = await db.models.Host.findAll({
    where: { team_id: team },
    order: [
      ['code', 'ASC'],
      ['id', 'ASC'],
    ],
    raw: true,
  });
  const seesNotes = may(ctx.role, 'people.read');
  return {
    hosts: rows.map(({ id, code, name, place_name, lat, lon, capacity, note, withdrawn_on }) => ({
      id: fromBinary(id),
      code,
      name,
      placeName: place_name,
      place: lat === null || lon === null ? null : seenPlace(ctx.role, { lat, lon, accuracyM: null }),
      capacity,
      note: seesNotes ? note : null,
      withdrawnOn: withdrawn_on,
    })),
  };
}
