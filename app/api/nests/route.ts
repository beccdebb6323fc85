import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { NEST_LIST_PARAMS, parseNestListQuery } from '@/lib/server/queries/nest-list-query';
import { nestsList } from '@/lib/server/queries/nests-list';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'nests.read',
    query: NEST_LIST_PARAMS,
    handler: async ({ ctx, query }) => nestsList(ctx, parseNestListQuery(query)),
  }),
});
