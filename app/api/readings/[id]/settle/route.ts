import { settleReading, SETTLE_INPUT } from '@/lib/server/commands/readings/settle-reading';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'readings.settle',
    input: SETTLE_INPUT,
    handler: async ({ ctx, path, input, clock }) => settleReading(ctx, { id: path.id ?? '', ...input }, clock.now()),
  }),
});
