import { changeRole } from '@/lib/server/commands/members/change-member';
import { ROLE_INPUT } from '@/lib/server/commands/members/inputs';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'members.write',
    input: ROLE_INPUT,
    handler: ({ ctx, path, input, clock }) => changeRole(ctx, { text: path.id, role: input.role }, clock.now()),
  }),
});
