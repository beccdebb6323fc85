import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { describeError, log } from '@/lib/server/log/log';
import { nestCondition } from '@/lib/server/queries/nest-conditions';
import { selectRows } from '@/lib/server/queries/select-rows';
import type { ExportLines } from './export-call';
import type { ExportQuery } from './export-query';
import { EXPORT_FILES } from './file-lines';
import { type Snapshot, openSnapshot } from './snapshot';
import { textStream } from './text-stream';

/** One download. */
export interface CsvRequest {
  /** As it stands in the address; anything may have been typed there. */
  file: string;
  query: ExportQuery;
  requestId: string;
}

/** A nest that is asked for by code must be one of the team's. */
async function requireNest({ scope }: Snapshot, code: string | undefined, zone: string): Promise<void> {
  if (code === undefined) return;
  const { sql, values } = nestCondition({ code }, zone);
  const [found] = await selectRows(scope, `SELECT 1 FROM nests n WHERE ${sql} LIMIT 1`, values);
  if (!found) throw new HttpProblem('not-found');
}

function respond(
  ctx: TeamContext,
  { file, query, requestId }: CsvRequest,
  { lines, snapshot }: { lines: ExportLines; snapshot: Snapshot },
) {
  const parts = lines({ ctx, scope: snapshot.scope, ...query });
  const stream = textStream(parts, async (error) => {
    if (error) log({ event: 'export-failed', requestId, ...describeError(error) });
    await snapshot.close();
  });
  return new Response(stream, {
    headers: { 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': `attachment; filename="${file}"` },
  });
}

/**
 * A CSV file as a stream that reads the team's data as it is now, page after page, as fast as the other end takes it.
 *
 * @throws HttpProblem `not-found` for a file there is none of, and for the code of no nest of the team.
 */
export async function csvResponse(ctx: TeamContext, request: CsvRequest): Promise<Response> {
  const lines = EXPORT_FILES.get(request.file);
  if (!lines) throw new HttpProblem('not-found');
  const snapshot = await openSnapshot(ctx);
  try {
    await requireNest(snapshot, request.query.filter.code, ctx.zone);
    return respond(ctx, request, { lines, snapshot });
  } catch (error) {
    await snapshot.close();
    throw error;
  }
}
