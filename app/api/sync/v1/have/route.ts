import { haveOps } from '@/lib/server/commands/sync/have-ops';
import { HAVE_INPUT } from '@/lib/server/commands/sync/inputs';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'sync.have',
    device: 'required',
    input: HAVE_INPUT,
    handler: ({ ctx, input, clock }) => haveOps(ctx, input.opIds, clock.now()),
  }),
});
