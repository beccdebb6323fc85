import { enrolDevice } from '@/lib/server/commands/sync/enrol-device';
import { ENROL_INPUT } from '@/lib/server/commands/sync/inputs';
import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  POST: route({
    action: 'sync.enrol',
    input: ENROL_INPUT,
    handler: ({ ctx, input, clock }) => enrolDevice(ctx, input.label, clock.now()),
  }),
});
