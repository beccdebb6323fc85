import { keepEstimate } from '@/lib/server/commands/estimates/keep-estimate';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { parseAsOf } from '@/lib/server/queries/as-of';
import { nestBrood } from '@/lib/server/queries/brood';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'brood.read',
    query: ['asOf'],
    handler: async ({ ctx, path, query, clock }) => {
      const brood = await nestBrood(ctx, path.id ?? '', parseAsOf(query.asOf, ctx.zone, clock.now()));
      await keepEstimate(ctx, brood, clock.now());
      return brood.estimate;
    },
  }),
});
