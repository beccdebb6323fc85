import { endMembership } from '@/lib/server/commands/members/change-member';
import { NOTHING_INPUT } from '@/lib/server/commands/members/inputs';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'signed-in',
    input: NOTHING_INPUT,
    handler: ({ ctx, clock }) => endMembership(ctx, ctx.userId, clock.now()),
  }),
});
