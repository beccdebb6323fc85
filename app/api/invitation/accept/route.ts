import { acceptInvitation } from '@/lib/server/commands/members/accept-invitation';
import { ACCEPT_INPUT } from '@/lib/server/commands/members/inputs';
import { methods } from '@/lib/server/http/methods';
import { publicRoute } from '@/lib/server/http/public-route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: publicRoute({
    input: ACCEPT_INPUT,
    handler: ({ input, address, clock }) => acceptInvitation({ ...input, address }, clock.now()),
  }),
});
