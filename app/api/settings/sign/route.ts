import { SIGN_INPUT } from '@/lib/server/commands/settings/draft-input';
import { signSettings } from '@/lib/server/commands/settings/sign-settings';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'settings.write',
    input: SIGN_INPUT,
    handler: async ({ ctx, input, clock }) => signSettings(ctx, input, clock.now()),
  }),
});
