import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { readingDetail } from '@/lib/server/queries/reading-detail';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'readings.read',
    handler: async ({ ctx, path }) => readingDetail(ctx, path.id ?? ''),
  }),
});
