import { TEAM_INPUT } from '@/lib/server/commands/account/inputs';
import { switchTeam } from '@/lib/server/commands/account/switch-team';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'signed-in',
    input: TEAM_INPUT,
    handler: ({ ctx, input, request, clock }) =>
      switchTeam(ctx, { ...input, agent: request.headers.get('user-agent') ?? '' }, clock.now()),
  }),
});
