import { DISCARD_INPUT } from '@/lib/server/commands/settings/draft-input';
import { discardDraft } from '@/lib/server/commands/settings/save-draft';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'settings.write',
    input: DISCARD_INPUT,
    handler: async ({ ctx, clock }) => discardDraft(ctx, clock.now()),
  }),
});
