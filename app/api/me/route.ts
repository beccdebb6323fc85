import { whoAmI } from '@/lib/server/commands/sync/who-am-i';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({ action: 'signed-in', handler: ({ ctx, clock }) => whoAmI(ctx, clock.now()) }),
});
