import 'server-only';
import { nestCondition } from '@/lib/server/queries/nest-conditions';
import type { NestRow } from '@/lib/server/queries/nest-rows';
import { selectRows } from '@/lib/server/queries/select-rows';
import type { ExportCall } from './export-call';

/** Nests whose visits and readings are held in memory at once. */
const PAGE = 50;

/** Nests after the last one of the page before, in the order of every file. */
async function nextPage({ ctx, scope, filter }: ExportCall, last: NestRow | undefined): Promise<NestRow[]> {
  const where = nestCondition(filter, ctx.zone);
  const after = last ? 'AND (n.code > :lastCode OR (n.code = :lastCode AND n.id > :lastId))' : '';
  return selectRows<NestRow>(
    scope,
    `SELECT n.* FROM nests n WHERE ${where.sql} ${after} ORDER BY n.code, n.id LIMIT ${PAGE}`,
    { ...where.values, ...(last && { lastCode: last.code, lastId: last.id }) },
  );
}

/** The nests of a download, a page at a time, by code; nests of one code by id. */
export async function* nestPages(call: ExportCall): AsyncGenerator<NestRow[]> {
  let last: NestRow | undefined;
  for (;;) {
    const page = await nextPage(call, last);
    if (page.length > 0) yield page;
    last = page.at(-1);
    if (page.length < PAGE) return;
  }
}
