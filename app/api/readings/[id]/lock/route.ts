import { lockReading, LOCK_INPUT } from '@/lib/server/commands/readings/lock-reading';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'readings.lock',
    input: LOCK_INPUT,
    handler: async ({ ctx, path, input, clock }) => lockReading(ctx, { id: path.id ?? '', ...input }, clock.now()),
  }),
});
