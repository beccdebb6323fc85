import { amendReading, AMEND_INPUT } from '@/lib/server/commands/readings/amend-reading';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'readings.amend',
    input: AMEND_INPUT,
    handler: async ({ ctx, path, input, clock }) => amendReading(ctx, { id: path.id ?? '', ...input }, clock.now()),
  }),
});
