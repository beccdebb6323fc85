import 'server-only';
import type { InferAttributes } from 'sequelize';
import { idKey } from '@/lib/server/queries/id-key';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { ReviewClaim } from '@/models/review-claim';

/** Who has taken on a second reading, as stored. */
export type ClaimRow = InferAttributes<ReviewClaim>;

/** Every claim of the team, by `idKey` of the visit. */
export async function reviewClaims({ team, db, transaction }: TeamScope): Promise<Map<string, ClaimRow>> {
  const rows = await db.models.ReviewClaim.findAll({ where: { team_id: team }, raw: true, transaction });
  return new Map(rows.map((row) => [idKey(row.visit_id), row]));
}

/** The claim on one visit; null while nobody has taken it on. */
export async function claimOf({ team, db, transaction }: TeamScope, visit: Buffer): Promise<ClaimRow | null> {
  return db.models.ReviewClaim.findOne({ where: { team_id: team, visit_id: visit }, raw: true, transaction });
}
