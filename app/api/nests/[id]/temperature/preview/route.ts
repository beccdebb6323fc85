import { previewTemperature } from '@/lib/server/queries/temperature/preview-temperature';
import { MAX_TEMPERATURE_BYTES, PREVIEW_INPUT } from '@/lib/server/commands/temperature/temperature-input';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'temperature.write',
    input: PREVIEW_INPUT,
    maxBytes: MAX_TEMPERATURE_BYTES,
    handler: async ({ ctx, path, input }) => previewTemperature(ctx, path.id ?? '', input),
  }),
});
