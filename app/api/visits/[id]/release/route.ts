import { CLAIM_INPUT } from '@/lib/server/commands/review/claim-visit';
import { releaseVisit } from '@/lib/server/commands/review/release-visit';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'review.work',
    input: CLAIM_INPUT,
    handler: ({ ctx, path, clock }) => releaseVisit(ctx, path.id ?? '', clock.now()),
  }),
});
