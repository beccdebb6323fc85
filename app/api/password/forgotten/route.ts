import { FORGOTTEN_INPUT } from '@/lib/server/commands/account/inputs';
import { requestReset } from '@/lib/server/commands/account/request-reset';
import { methods } from '@/lib/server/http/methods';
import { publicRoute } from '@/lib/server/http/public-route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: publicRoute({
    input: FORGOTTEN_INPUT,
    handler: ({ input, address, clock }) => requestReset({ ...input, address }, clock.now()),
  }),
});
