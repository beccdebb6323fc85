import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import type { ExportLines } from './export-call';
import type { ExportQuery } from './export-query';
import { EXPORT_FILES } from './file-lines';
import { requireNest } from './require-nest';
import { type Snapshot, openSnapshot } from './snapshot';

/** Rows below the header. */
async function rowsOf(lines: ExportLines, ctx: TeamContext, on: { snapshot: Snapshot; query: ExportQuery }) {
  let count = -1;
  for await (const _ of lines({ ctx, scope: on.snapshot.scope, ...on.query })) count += 1;
  return count;
}

/**
 * How many rows each file will have, by its name: the same rows that a download would write, so the person who asks
 * counts only what they may see.
 *
 * @throws HttpProblem `not-found` for the code of no nest of the team.
 */
export async function rowCounts(ctx: TeamContext, query: ExportQuery): Promise<{ rows: Record<string, number> }> {
  const snapshot = await openSnapshot(ctx);
  try {
    await requireNest(snapshot, query.filter.code, ctx.zone);
    const rows: Record<string, number> = {};
    for (const [name, lines] of EXPORT_FILES) rows[name] = await rowsOf(lines, ctx, { snapshot, query });
    return { rows };
  } finally {
    await snapshot.close();
  }
}
