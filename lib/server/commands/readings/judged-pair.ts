import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { type Comparison, comparisonOf } from '@/lib/server/queries/review/comparison';
import { type TeamReviewSettings, teamReviewSettings } from '@/lib/server/queries/review/review-settings';
import { reviewVisit } from '@/lib/server/queries/review/review-visits';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { LabWork } from './lab-work';

/** What a decision is judged by. */
export interface Judgement {
  settings: TeamReviewSettings;
  /** The second reading of the visit; null while there is none. */
  second: ReadingRow | null;
  /** Null without a second reading: then there is nothing to compare. */
  comparison: Comparison | null;
}

/**
 * Looks whether the person may decide about this reading: it has to be the field reading that counts, and where a
 * second reading differs too much from it, the lead biologist settles.
 *
 * @throws HttpProblem `not-primary` or `lead-settles`.
 */
export async function judge(ctx: TeamContext, { scope, source, final }: LabWork): Promise<Judgement> {
  const settings = await teamReviewSettings(scope);
  const visit = await reviewVisit(scope, source.visit_id);
  const { choice = null, second = null } = visit ?? {};
  if (choice && !choice.reading_id.equals(source.id)) throw new HttpProblem('not-primary');
  if (!second || source.kind !== 'field') return { settings, second: null, comparison: null };
  const comparison = await comparisonOf(scope, { field: source, second, final }, settings.values);
  if (comparison.settler === 'lead' && ctx.role !== 'biologist') throw new HttpProblem('lead-settles');
  return { settings, second, comparison };
}
