import 'server-only';
import type { Clock } from '@/lib/kit/clock';
import type { Json } from '@/lib/protocol/canonical-json';
import { MAX_OPS_PER_PUSH, PROTOCOL } from '@/lib/protocol/limits';
import type { PushResponse } from '@/lib/protocol/push';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { pushOps } from '@/lib/server/commands/push';
import type { EnrolledDevice } from '@/lib/server/http/device-of';
import { HttpProblem } from '@/lib/server/http/problem';
import { logEnds } from './log-ends';
import { countPush } from './push-allowance';
import { epochMismatch, writableEpoch } from './server-epoch';

/** A push as it came, its envelope checked. */
export interface PushInput {
  epoch: number;
  ops: readonly Json[];
  /** The texts of `ops`. */
  raws: readonly string[];
  device: EnrolledDevice | null;
  clock: Clock;
}

/**
 * Takes a push: counts it, checks its size and epoch, then each operation by itself.
 *
 * @throws HttpProblem `batch`, `too-many`, `epoch-mismatch`, or `busy` while a restore is not finished.
 */
export async function takePush(
  ctx: TeamContext,
  { epoch, ops, raws, device, clock }: PushInput,
): Promise<PushResponse> {
  if (ops.length > MAX_OPS_PER_PUSH) throw new HttpProblem('batch');
  if (device) await countPush(device.deviceId, clock.now());
  const ours = await writableEpoch();
  if (epoch !== ours) throw epochMismatch(ours);
  const rawOps = ops.map((value, index) => ({ value, raw: raws[index] ?? JSON.stringify(value) }));
  const results = await pushOps(ctx, rawOps, { device, clock });
  const serverTime = new Date(clock.now()).toISOString();
  const { safeSeq } = await logEnds(ctx);
  return { protocol: PROTOCOL, epoch: ours, serverTime, safeSeq, results };
}
