import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { temperatureFile } from '@/lib/server/queries/temperature/temperature-file';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({
    action: 'temperature.read',
    handler: async ({ ctx, path }) => temperatureFile(ctx, { id: path.id ?? '', record: path.record ?? '' }),
  }),
});
