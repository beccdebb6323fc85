import 'server-only';
import { Op } from 'sequelize';
import { estimateAtHand } from '@/lib/server/queries/estimate-at-hand';
import type { BroodSettings } from '@/lib/brood/settings';
import { type DateShift, dateShifts } from '@/lib/brood/team-settings/date-shift';
import type { Clock } from '@/lib/kit/clock';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { parseAsOf } from '@/lib/server/queries/as-of';
import { broodInput } from '@/lib/server/queries/brood';
import { broodSettingsOf, teamBroodSettings } from '@/lib/server/queries/brood-settings';
import type { NestRow } from '@/lib/server/queries/nest-rows';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { draftOf } from './settings-rows';

/** Most nests of one answer, and the time after which no other nest is begun. */
const MAX_NESTS = 5;
const MAX_MS = 1_500;

/** How one nest's dates would move. */
export interface NestShift {
  id: string;
  code: string;
  founded: DateShift;
  firstEmergence: DateShift;
}

/** A part of the answer of `GET /api/settings/draft/impact`. */
export interface SettingsImpact {
  nests: NestShift[];
  /** Nests looked at in this part, those without a date included. */
  looked: number;
  /** All nests of the team that are not archived. */
  total: number;
  /** Ask with this `after` for the next part; null when all nests have been looked at. */
  next: string | null;
}

/** Both settings and the day all nests are looked at from. */
interface Comparison {
  scope: TeamScope;
  before: BroodSettings;
  after: BroodSettings;
  zone: string;
  asOf: number;
}

async function nestsAfter({ team, db }: TeamScope, after: string | undefined): Promise<NestRow[]> {
  if (after !== undefined && !isUuidText(after)) throw new HttpProblem('param');
  const later = after === undefined ? {} : { id: { [Op.gt]: toBinary(after) } };
  return db.models.Nest.findAll({
    where: { team_id: team, archived_at: null, ...later },
    order: [['id', 'ASC']],
    limit: MAX_NESTS,
    raw: true,
  });
}

async function shiftOf(nest: NestRow, { scope, before, after, zone, asOf }: Comparison): Promise<NestShift> {
  const input = await broodInput(scope, nest, { zone, asOf });
  const estimates = [before, after].map((settings) => estimateAtHand(scope, { ...input, settings }));
  const [was, is] = estimates;
  if (!was || !is) throw new Error('two settings give two estimates');
  return { id: fromBinary(nest.id), code: nest.code, ...dateShifts(was, is) };
}

/** Does anything at all get a date? */
function isDated({ founded, firstEmergence }: NestShift): boolean {
  return [founded, firstEmergence].some(({ before, after }) => before !== null || after !== null);
}

/**
 * `GET /api/settings/draft/impact`: how far the dates of some nests would move if the draft were signed. The answer
 * comes in parts, each bounded in nests and time, so that a large programme blocks nobody.
 *
 * @param after id of the last nest of the part before.
 * @throws HttpProblem `no-draft`, or `param` for an `after` that is no id.
 */
export async function settingsImpact(
  ctx: TeamContext,
  after: string | undefined,
  clock: Clock,
): Promise<SettingsImpact> {
  const scope = teamScope(ctx);
  const draft = await draftOf(scope);
  if (!draft) throw new HttpProblem('no-draft');
  const { settings } = await teamBroodSettings(scope);
  const start = clock.now();
  const comparison: Comparison = {
    ...{ scope, before: settings, after: broodSettingsOf(draft.content, 'draft'), zone: ctx.zone },
    asOf: parseAsOf(undefined, ctx.zone, start),
  };
  const rows = await nestsAfter(scope, after);
  const nests: NestShift[] = [];
  for (const row of rows) {
    if (nests.length > 0 && clock.now() - start > MAX_MS) break;
    nests.push(await shiftOf(row, comparison));
  }
  const isLast = nests.length === rows.length && rows.length < MAX_NESTS;
  return {
    nests: nests.filter(isDated),
    looked: nests.length,
    total: await scope.db.models.Nest.count({ where: { team_id: scope.team, archived_at: null } }),
    next: isLast ? null : (nests.at(-1)?.id ?? null),
  };
}
