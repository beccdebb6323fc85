import { pullPage } from '@/lib/server/commands/sync/pull-page';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'sync.pull',
    device: 'optional',
    query: ['cursor', 'limit'],
    handler: ({ ctx, query, clock }) => pullPage(ctx, query, clock.now()),
  }),
});
