import { revokeDevice, REVOKE_INPUT } from '@/lib/server/commands/devices/revoke-device';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'devices.revoke',
    input: REVOKE_INPUT,
    handler: ({ ctx, path, input, clock }) => revokeDevice(ctx, { text: path.id, ...input }, clock.now()),
  }),
});
