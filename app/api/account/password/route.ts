import { changePassword } from '@/lib/server/commands/account/change-password';
import { PASSWORD_INPUT } from '@/lib/server/commands/account/inputs';
import { clientAddress } from '@/lib/server/http/client-address';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'signed-in',
    input: PASSWORD_INPUT,
    handler: ({ ctx, input, request, clock }) =>
      changePassword(ctx, { ...input, address: clientAddress(request.headers) }, clock.now()),
  }),
});
