import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type TeamBroodSettings, teamBroodSettings } from './brood-settings';
import { teamScope } from './team-scope';

/** Every number behind the team's estimates, with its trust and source. */
export async function estimateSettings(ctx: TeamContext): Promise<TeamBroodSettings> {
  return teamBroodSettings(teamScope(ctx));
}
