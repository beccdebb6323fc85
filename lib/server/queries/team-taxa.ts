import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { teamScope } from './team-scope';

/** A kind the team knows, with its status in the team's area. */
export interface TeamTaxon {
  name: string;
  status: string;
}

/** The team's taxa by name. */
export async function teamTaxa(ctx: TeamContext): Promise<TeamTaxon[]> {
  const { team, db } = teamScope(ctx);
  const rows = await db.models.Taxon.findAll({
    where: { team_id: team },
    order: [['scientific_name', 'ASC']],
    raw: true,
  });
  return rows.map((row) => ({ name: row.scientific_name, status: row.status }));
}
