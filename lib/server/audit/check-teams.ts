import 'server-only';
import type { InferAttributes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import type { Team } from '@/models/team';
import { auditSnapshot } from './audit-snapshot';
import { type AuditFault, knowsHead, verifyAudit } from './verify-audit';

/** What the check of one team found. */
export interface TeamAudit {
  team: string;
  entries: number;
  finals: number;
  settlements: number;
  /** Hash of the last entry, to be noted outside this machine. */
  head: string;
  /** The noted heads that are links of this team's chain. */
  known: string[];
  /** Earliest link first. */
  faults: AuditFault[];
}

/** No person's rows are asked for: the check belongs to whoever keeps the machine. */
const NOBODY = Buffer.alloc(16);

async function checkTeam(team: InferAttributes<Team>, noted: readonly string[]): Promise<TeamAudit> {
  const db = database();
  return db.sequelize.transaction(async (transaction) => {
    const snapshot = await auditSnapshot({ team: team.id, user: NOBODY, db, transaction });
    const { entries, finals, settlements, head } = snapshot;
    return {
      team: team.name,
      entries: entries.length,
      finals: finals.length,
      settlements: settlements.length,
      head: head.hash,
      known: noted.filter((hash) => knowsHead(snapshot, hash)),
      faults: verifyAudit(snapshot),
    };
  });
}

/**
 * Checks the audit chains of all teams on this machine, one after the other.
 *
 * @param noted heads noted earlier, lower-case hex.
 */
export async function checkTeams(noted: readonly string[]): Promise<TeamAudit[]> {
  const teams = await database().models.Team.findAll({ order: [['name', 'ASC']], raw: true });
  const checked: TeamAudit[] = [];
  for (const team of teams) checked.push(await checkTeam(team, noted));
  return checked;
}
