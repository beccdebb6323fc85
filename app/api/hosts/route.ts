import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { hosts } from '@/lib/server/queries/hosts';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({ action: 'hosts.read', handler: async ({ ctx }) => hosts(ctx) }),
});
