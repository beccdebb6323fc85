import 'server-only';
import { idKey } from './id-key';
import type { ReadingRow } from './reading-rows';
import type { TeamScope } from './team-scope';

/** The visits (as keys of `idKey`) at which the person who asks is still making a second reading. */
export type BlindVisits = ReadonlySet<string>;

/** Where the person who asks must not see what others read: visits with an own second reading not yet submitted. */
export async function blindVisits({ team, user, db, transaction }: TeamScope): Promise<BlindVisits> {
  const own = await db.models.Reading.findAll({
    attributes: ['visit_id'],
    where: { team_id: team, opened_by: user, kind: 'second', submitted_at: null },
    raw: true,
    transaction,
  });
  return new Set(own.map((reading) => idKey(reading.visit_id)));
}

/** Is this reading kept from the person who asks? Their own stay visible; a final reading shows what others read. */
export function isHidden(reading: ReadingRow, { user }: TeamScope, blind: BlindVisits): boolean {
  if (!blind.has(idKey(reading.visit_id))) return false;
  return reading.kind === 'final' || !reading.opened_by.equals(user);
}
