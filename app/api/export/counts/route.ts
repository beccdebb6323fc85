import { EXPORT_PARAMS, parseExportQuery } from '@/lib/server/export/export-query';
import { rowCounts } from '@/lib/server/export/row-counts';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'export.read',
    query: EXPORT_PARAMS,
    handler: async ({ ctx, query }) => rowCounts(ctx, parseExportQuery(query)),
  }),
});
