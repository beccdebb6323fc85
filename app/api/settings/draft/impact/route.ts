import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { settingsImpact } from '@/lib/server/queries/settings/settings-impact';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'settings.write',
    query: ['after'],
    handler: async ({ ctx, query, clock }) => settingsImpact(ctx, query.after, clock),
  }),
});
