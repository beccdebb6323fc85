import 'server-only';
import { idKey } from './id-key';
import type { ReadingRow } from './reading-rows';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** The visits (as keys of `idKey`) at which the person who asks is making a second reading, or has taken one on. */
export type BlindVisits = ReadonlySet<string>;

const OWN_OPEN = `
  SELECT visit_id FROM readings
  WHERE team_id = :team AND opened_by = :user AND kind = 'second' AND submitted_at IS NULL`;

/** A claim blinds until the second reading it was made for is handed in, or the claim is given back. */
const CLAIMED = `
  SELECT c.visit_id FROM review_claims c
  WHERE c.team_id = :team AND c.user_id = :user AND NOT EXISTS (
    SELECT 1 FROM readings r WHERE r.team_id = :team AND r.visit_id = c.visit_id
    AND r.opened_by = :user AND r.kind = 'second' AND r.submitted_at IS NOT NULL)`;

/**
 * Where the person who asks must not see what others read: visits they have taken on for a second reading, and visits
 * with an own second reading not yet submitted.
 */
export async function blindVisits(scope: TeamScope): Promise<BlindVisits> {
  const rows = await selectRows<{ visit_id: Buffer }>(scope, `${OWN_OPEN} UNION ${CLAIMED}`, { user: scope.user });
  return new Set(rows.map(({ visit_id }) => idKey(visit_id)));
}

/** Is this reading kept from the person who asks? Their own stay visible; a final reading shows what others read. */
export function isHidden(
  reading: Pick<ReadingRow, 'visit_id' | 'kind' | 'opened_by'>,
  { user }: TeamScope,
  blind: BlindVisits,
): boolean {
  if (!blind.has(idKey(reading.visit_id))) return false;
  return reading.kind === 'final' || !reading.opened_by.equals(user);
}
