import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { describeError, log } from '@/lib/server/log/log';
import type { ExportLines } from './export-call';
import type { ExportRequest } from './export-request';
import { EXPORT_FILES } from './file-lines';
import { requireNest } from './require-nest';
import { type Snapshot, openSnapshot } from './snapshot';
import { textStream } from './text-stream';
import { ZIP_NAME, zipResponse } from './zip-response';

function respond(
  ctx: TeamContext,
  { file, query, requestId }: ExportRequest,
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
 * A CSV file, or all of them as an archive, as a stream that reads the team's data as it is now, page after page, as fast as the other end takes it.
 *
 * @throws HttpProblem `not-found` for a file there is none of, and for the code of no nest of the team.
 */
export async function exportResponse(ctx: TeamContext, request: ExportRequest): Promise<Response> {
  const lines = EXPORT_FILES.get(request.file);
  if (!lines && request.file !== ZIP_NAME) throw new HttpProblem('not-found');
  const snapshot = await openSnapshot(ctx);
  try {
    await requireNest(snapshot, request.query.filter.code, ctx.zone);
    return lines ? respond(ctx, request, { lines, snapshot }) : zipResponse(ctx, request, snapshot);
  } catch (error) {
    await snapshot.close();
    throw error;
  }
}
