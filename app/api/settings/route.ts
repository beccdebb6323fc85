import { methods } from '@/lib/server/http/methods';
import { route } from '@/lib/server/http/route';
import { settingsAnswer } from '@/lib/server/queries/settings/settings-answer';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: route({ action: 'settings.read', handler: async ({ ctx }) => settingsAnswer(ctx) }),
});
