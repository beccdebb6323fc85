import { keepTemperature } from '@/lib/server/commands/temperature/keep-temperature';
import { KEEP_INPUT, MAX_TEMPERATURE_BYTES } from '@/lib/server/commands/temperature/temperature-input';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { nestTemperature } from '@/lib/server/queries/temperature/nest-temperature';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'temperature.read',
    handler: async ({ ctx, path }) => nestTemperature(ctx, path.id ?? ''),
  }),
  POST: route({
    action: 'temperature.write',
    input: KEEP_INPUT,
    maxBytes: MAX_TEMPERATURE_BYTES,
    handler: async ({ ctx, path, input, clock }) => keepTemperature(ctx, { id: path.id ?? '', input }, clock.now()),
  }),
});
