import { RESET_INPUT } from '@/lib/server/commands/account/inputs';
import { resetPassword } from '@/lib/server/commands/account/reset-password';
import { methods } from '@/lib/server/http/methods';
import { publicRoute } from '@/lib/server/http/public-route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: publicRoute({ input: RESET_INPUT, handler: ({ input, clock }) => resetPassword(input, clock.now()) }),
});
