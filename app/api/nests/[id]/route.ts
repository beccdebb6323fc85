import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { nestDetail } from '@/lib/server/queries/nest-detail';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'nests.read',
    handler: async ({ ctx, path }) => nestDetail(ctx, path.id ?? ''),
  }),
});
