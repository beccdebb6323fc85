import { PRIMARY_INPUT, choosePrimary } from '@/lib/server/commands/review/choose-primary';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'readings.settle',
    input: PRIMARY_INPUT,
    handler: ({ ctx, path, input, clock }) => choosePrimary(ctx, { id: path.id ?? '', ...input }, clock.now()),
  }),
});
