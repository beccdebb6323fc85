import { endMembership } from '@/lib/server/commands/members/change-member';
import { NOTHING_INPUT } from '@/lib/server/commands/members/inputs';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'members.write',
    input: NOTHING_INPUT,
    handler: ({ ctx, path, clock }) => endMembership(ctx, path.id, clock.now()),
  }),
});
