import { exportResponse } from '@/lib/server/export/export-response';
import { EXPORT_PARAMS, parseExportQuery } from '@/lib/server/export/export-query';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'export.read',
    query: EXPORT_PARAMS,
    handler: async ({ ctx, path, query, requestId, clock }) =>
      exportResponse(ctx, {
        file: path.file ?? '',
        query: parseExportQuery(query),
        requestId,
        nowMs: clock.now(),
      }),
  }),
});
