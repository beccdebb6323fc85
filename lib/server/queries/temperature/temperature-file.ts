import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { nestById } from '@/lib/server/queries/nest-rows';
import { teamScope } from '@/lib/server/queries/team-scope';
import { temperatureById } from './temperature-rows';

/** Characters that would end or bend a header. */
const UNFIT = /[^\w.() -]/g;

/**
 * `GET /api/nests/<id>/temperature/<record>`: the text of a record as it came.
 *
 * @throws HttpProblem `not-found`.
 */
export async function temperatureFile(ctx: TeamContext, path: { id: string; record: string }): Promise<Response> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, path.id);
  const { raw, file_name, source } = await temperatureById(scope, nest.id, path.record);
  const name = file_name?.replace(UNFIT, '_') ?? `temperature.${source === 'hand' ? 'json' : 'csv'}`;
  return new Response(raw, {
    headers: {
      'Content-Type': 'text/plain; charset=utf-8',
      'Content-Disposition': `attachment; filename="${name}"`,
    },
  });
}
