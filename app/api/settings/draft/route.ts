import { DRAFT_INPUT } from '@/lib/server/commands/settings/draft-input';
import { saveDraft } from '@/lib/server/commands/settings/save-draft';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  PUT: route({
    action: 'settings.write',
    input: DRAFT_INPUT,
    handler: async ({ ctx, input, clock }) => saveDraft(ctx, input, clock.now()),
  }),
});
