import { removeTemperature } from '@/lib/server/commands/temperature/remove-temperature';
import { REMOVE_INPUT } from '@/lib/server/commands/temperature/temperature-input';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'temperature.write',
    input: REMOVE_INPUT,
    handler: async ({ ctx, path, input: { reason }, clock }) =>
      removeTemperature(ctx, { path: { id: path.id ?? '', record: path.record ?? '' }, reason }, clock.now()),
  }),
});
