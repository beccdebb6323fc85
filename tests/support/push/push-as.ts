import type { Clock } from '@/lib/kit/clock';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import type { PushResult } from '@/lib/protocol/push';
import { memberContext } from '@/lib/server/auth/member-context';
import { pushOps } from '@/lib/server/commands/push';
import type { TestMember, TestTeam } from '@/tests/support/factories/make-team';

/** When the office receives what tests push: twenty minutes after the operations of `wireOp` were made. */
export const RECEIVED_MS = Date.parse('2026-06-16T06:00:00-04:00');

/** A clock that stands still at `RECEIVED_MS`. */
const OFFICE_CLOCK: Clock = {
  now: () => RECEIVED_MS,
  mono: () => 0,
  boot: () => '00000000-0000-4000-8000-000000000000',
};

/** Pushes operations in a member's name, without HTTP. */
export async function pushAs(team: TestTeam, member: TestMember, ops: readonly (Op | Json)[]): Promise<PushResult[]> {
  const ctx = await memberContext(team.teamId, member.userId);
  const rawOps = ops.map((op) => ({ value: op as Json, raw: JSON.stringify(op) }));
  return pushOps(ctx, rawOps, { device: null, clock: OFFICE_CLOCK });
}

/** Outcome and code of each result, as one word or two: `applied`, `quarantined exists`. */
export function wordsOf(results: readonly PushResult[]): string[] {
  return results.map(({ r, code }) => (code === undefined ? r : `${r} ${code}`));
}
