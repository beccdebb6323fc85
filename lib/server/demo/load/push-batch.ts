import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { applyOps } from '@/lib/server/commands/push';
import type { PushStep } from '@/lib/server/demo/build/season-steps';

/**
 * Pushes one batch in the person's name, at its time in the season. Operations that are there already stay as they
 * are, so a batch may be pushed again.
 *
 * @throws when the office does not take an operation: then the demo does not fit this version of the product.
 */
export async function pushBatch(ctx: TeamContext, { ops, atMs }: PushStep): Promise<void> {
  const results = await applyOps(ctx, ops, { receivedAt: new Date(atMs) });
  const refused = results.find(({ r }) => r !== 'applied' && r !== 'duplicate');
  if (refused)
    throw new Error(
      `The demo operation ${String(refused.opId)} was answered ${refused.r} (${refused.code ?? 'no code'}).`,
    );
}
