import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { reviewQueue } from '@/lib/server/queries/review/review-queue';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({ action: 'review.read', handler: ({ ctx, clock }) => reviewQueue(ctx, clock.now()) }),
});
