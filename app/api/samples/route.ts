import { SAMPLES_INPUT, drawSamples } from '@/lib/server/commands/samples/draw-samples';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'samples.draw',
    input: SAMPLES_INPUT,
    handler: async ({ ctx, input, clock }) => drawSamples(ctx, input.month, clock.now()),
  }),
});
