import { INVITE_INPUT } from '@/lib/server/commands/members/inputs';
import { inviteMember } from '@/lib/server/commands/members/invite-member';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'members.write',
    input: INVITE_INPUT,
    handler: ({ ctx, input, clock }) => inviteMember(ctx, input, clock.now()),
  }),
});
