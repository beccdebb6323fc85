import { PUSH_INPUT } from '@/lib/server/commands/sync/inputs';
import { takePush } from '@/lib/server/commands/sync/take-push';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'sync.push',
    device: 'required',
    input: PUSH_INPUT,
    handler: ({ ctx, input: { epoch, ops }, rawItems, device, clock }) =>
      takePush(ctx, { epoch, ops, raws: rawItems.get('ops') ?? [], device, clock }),
  }),
});
