import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { learning } from '@/lib/server/queries/settings/learning';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({ action: 'settings.read', handler: async ({ ctx, clock }) => learning(ctx, clock.now()) }),
});
