import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type NestList, type NestSummary, presentNestSummary } from '@/lib/server/presenters/present-nest';
import { nestWork } from './census-cells';
import { idKey } from './id-key';
import { type SqlCondition, nestCondition } from './nest-conditions';
import { type NestListQuery, SORT_COLUMNS } from './nest-list-query';
import { nestState } from './nest-state';
import { selectRows } from './select-rows';
import { type TeamScope, teamScope } from './team-scope';

/** Nests on one page of the list. */
const NESTS_PER_PAGE = 25;

/** Nests whose marks are read at once when the list is sorted by cells. */
const CHUNK = 100;

const VISITS_OF_NEST = 'FROM visits v WHERE v.team_id = :team AND v.nest_id = n.id AND v.archived_at IS NULL';

/** A part of the ordered list. */
interface Slice {
  limit: number;
  offset: number;
}

/** The ids of matching nests in order. Text from outside never becomes part of the SQL: the column is looked up. */
async function orderedIds(
  scope: TeamScope,
  query: NestListQuery & { where: SqlCondition },
  slice?: Slice,
): Promise<Buffer[]> {
  const column = SORT_COLUMNS[query.sort] ?? 'n.code';
  const rows = await selectRows<{ id: Buffer }>(
    scope,
    `SELECT n.id, (SELECT COUNT(*) ${VISITS_OF_NEST}) AS visit_count, (SELECT MAX(v.started_at) ${VISITS_OF_NEST}) AS last_visit
     FROM nests n WHERE ${query.where.sql}
     ORDER BY ${column} ${query.descending ? 'DESC' : 'ASC'}, n.code, n.id ${slice ? 'LIMIT :limit OFFSET :offset' : ''}`,
    { ...query.where.values, ...slice },
  );
  return rows.map((row) => row.id);
}

/** The ids of matching nests by the size of their census; nests without one count as smallest. */
async function idsByCells(scope: TeamScope, query: NestListQuery & { where: SqlCondition }): Promise<Buffer[]> {
  const ids = await orderedIds(scope, { ...query, descending: false });
  const sized: { id: Buffer; cells: number }[] = [];
  for (let start = 0; start < ids.length; start += CHUNK) {
    const chunk = ids.slice(start, start + CHUNK);
    const work = await nestWork(scope, chunk);
    for (const id of chunk) sized.push({ id, cells: work.get(idKey(id))?.cells ?? -1 });
  }
  const sign = query.descending ? -1 : 1;
  return sized.sort((a, b) => sign * (a.cells - b.cells)).map(({ id }) => id);
}

async function summaries(scope: TeamScope, ids: Buffer[]): Promise<NestSummary[]> {
  if (ids.length === 0) return [];
  const where = { team_id: scope.team, id: ids };
  const rows = await scope.db.models.Nest.findAll({ where, raw: true, transaction: scope.transaction });
  const byId = new Map(rows.map((row) => [idKey(row.id), row]));
  const work = await nestWork(scope, ids);
  return ids.flatMap((id) => {
    const nest = byId.get(idKey(id));
    const { visits = [], readings = [], cells = null } = work.get(idKey(id)) ?? {};
    return nest ? [presentNestSummary(nest, { visits, cells, state: nestState(nest.archived_at, readings) })] : [];
  });
}

/** `GET /api/nests`: one page of the team's nests. A page after the last one is empty. */
export async function nestsList(ctx: TeamContext, query: NestListQuery): Promise<NestList> {
  const scope = teamScope(ctx);
  const where = nestCondition(query.filter, ctx.zone);
  const [count] = await selectRows<{ total: number }>(
    scope,
    `SELECT COUNT(*) AS total FROM nests n WHERE ${where.sql}`,
    where.values,
  );
  const total = Number(count?.total ?? 0);
  const slice = { limit: NESTS_PER_PAGE, offset: (query.page - 1) * NESTS_PER_PAGE };
  const ids =
    query.sort === 'cells'
      ? (await idsByCells(scope, { ...query, where })).slice(slice.offset, slice.offset + slice.limit)
      : await orderedIds(scope, { ...query, where }, slice);
  const pages = Math.max(1, Math.ceil(total / NESTS_PER_PAGE));
  return { nests: await summaries(scope, ids), total, page: query.page, pages };
}
