import 'server-only';
import type { Clock } from '@/lib/kit/clock';
import { MAX_OPS_PER_PUSH } from '@/lib/protocol/limits';
import type { Op } from '@/lib/protocol/op';
import type { PushResult } from '@/lib/protocol/push';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { Outcome } from './candidate';
import { type Item, itemsOf } from './item';
import { type PushJob, pushTransaction } from './push-transaction';
import { type RawOp, memberOf } from './raw-op';
import type { World } from './world';

/** The answer about one item, echoing what came. */
function resultOf({ value }: Item, outcome: Outcome | undefined): PushResult {
  if (!outcome) throw new Error('An operation was left without an outcome');
  const echo = { opId: memberOf(value, 'opId'), r: outcome.r, bodyHash: memberOf(value, 'bodyHash') };
  return 'seq' in outcome ? { ...echo, seq: outcome.seq } : { ...echo, code: outcome.code };
}

/** Where the team works, to tell swapped coordinates; read outside the transaction, as it hardly ever changes. */
async function homeOf(ctx: TeamContext): Promise<World['home']> {
  const team = await database().models.Team.findByPk(toBinary(ctx.teamId));
  const [lat, lon] = [team?.home_lat ?? null, team?.home_lon ?? null];
  return lat === null || lon === null ? null : { lat, lon };
}

async function push(job: Omit<PushJob, 'items' | 'home'>, rawOps: readonly RawOp[]): Promise<PushResult[]> {
  if (rawOps.length === 0) return [];
  const items = itemsOf(rawOps);
  const home = await homeOf(job.ctx);
  const outcomes = await inTransaction((transaction) => pushTransaction({ ...job, items, home }, transaction));
  return items.map((item) => resultOf(item, outcomes.get(item.index)));
}

/**
 * Takes a batch of operations in a member's name: applies, recognises, parks, sets aside or refuses each one.
 *
 * @param device the enrolled device that sent them; null when they came another way.
 * @returns one result an operation, in the order of the request.
 */
export async function pushOps(
  ctx: TeamContext,
  rawOps: readonly RawOp[],
  { device, clock }: { device: { deviceId: string } | null; clock: Clock },
): Promise<PushResult[]> {
  return push({ ctx, deviceId: device?.deviceId ?? null, receivedMs: clock.now() }, rawOps);
}

/**
 * Takes operations made on this machine, in batches of the size a phone sends.
 *
 * @param receivedAt when the office is to have received them.
 */
export async function applyOps(
  ctx: TeamContext,
  ops: readonly Op[],
  { receivedAt }: { receivedAt: Date },
): Promise<PushResult[]> {
  const results: PushResult[] = [];
  for (let start = 0; start < ops.length; start += MAX_OPS_PER_PUSH) {
    const batch = ops.slice(start, start + MAX_OPS_PER_PUSH).map((op) => {
      const raw = JSON.stringify(op);
      return { value: JSON.parse(raw), raw };
    });
    results.push(...(await push({ ctx, deviceId: null, receivedMs: receivedAt.getTime() }, batch)));
  }
  return results;
}
