import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { describeError, log } from '@/lib/server/log/log';
import { byteStream } from './byte-stream';
import type { ExportRequest } from './export-request';
import { EXPORT_FILES } from './file-lines';
import type { Snapshot } from './snapshot';
import { zipPieces } from './zip-pieces';

/** Its name in the address. */
export const ZIP_NAME = 'everything.zip';

const DAY_MS = 86_400_000;

/** Every file of the team, dictionary included, as one archive of one moment. */
export function zipResponse(
  ctx: TeamContext,
  { query, requestId, nowMs }: ExportRequest,
  snapshot: Snapshot,
): Response {
  // To the day, so that asking twice for unchanged data gives the same bytes.
  const pieces = zipPieces(EXPORT_FILES, { ctx, scope: snapshot.scope, ...query }, nowMs - (nowMs % DAY_MS));
  const stream = byteStream(pieces, async (error) => {
    if (error) log({ event: 'export-failed', requestId, ...describeError(error) });
    await snapshot.close();
  });
  return new Response(stream, {
    headers: { 'Content-Type': 'application/zip', 'Content-Disposition': `attachment; filename="${ZIP_NAME}"` },
  });
}
