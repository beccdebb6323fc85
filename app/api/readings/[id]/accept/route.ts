import { ACCEPT_INPUT, acceptAlike } from '@/lib/server/commands/readings/accept-alike';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'readings.settle',
    input: ACCEPT_INPUT,
    handler: async ({ ctx, path, clock }) => acceptAlike(ctx, path.id ?? '', clock.now()),
  }),
});
