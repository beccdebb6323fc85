import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { opsInCycles } from '@/lib/protocol/check-deps';
import { opsWithMonoFlag } from '@/lib/protocol/op-flags';
import type { ValidOp } from '@/lib/protocol/validate-op';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { Aside } from './aside';
import type { Candidate, Outcome } from './candidate';
import { quarantined } from './decision';
import type { Item } from './item';
import { loadKnown } from './load-known';
import { lockCounter, saveCounter } from './lock-counter';
import { type ParkedRow, kindToken, loadParked } from './parked-rows';
import { type PushRun, applyAll, newRun } from './push-run';
import { memberOf } from './raw-op';
import { reviveParked } from './revive-parked';
import { writeAudit } from './write-audit';
import type { World } from './world';
import { writeRows } from './writes';

/** What a push transaction works on; none of it is changed, so that the transaction can be run again. */
export interface PushJob {
  ctx: TeamContext;
  /** In the order of the request. */
  items: readonly Item[];
  deviceId: string | null;
  receivedMs: number;
  home: World['home'];
}

/** What became of each item, by its place in the request. */
export type Outcomes = Map<number, Outcome>;

/** Keeps aside what is not applied. What was refused stays on the phone and is not kept. */
function keepAside(aside: Aside, job: PushJob, { item, outcome }: { item: Item; outcome: Outcome }): void {
  if (outcome.r === 'applied' || outcome.r === 'duplicate') return aside.settleDigest(item.digest);
  if (outcome.r === 'refused') return;
  aside.keep({
    digest: item.digest,
    opId: memberOf(item.value, 'opId'),
    state: outcome.r,
    code: outcome.code,
    raw: item.raw,
    missing: outcome.r === 'parked' ? outcome.missing : [],
    actorId: job.ctx.userId,
    receivedMs: job.receivedMs,
  });
}

/** Operations as the phone made them: by its counter, then as they came. */
function inOrder(items: readonly Item[]): (Item & { op: ValidOp })[] {
  const valid = items.flatMap((item) => (item.checked.ok ? [{ ...item, op: item.checked.value }] : []));
  return valid.sort((a, b) => a.op.n - b.op.n || a.index - b.index);
}

/** The batch as far as it could be judged before anything was read. */
interface Judged {
  items: readonly (Item & { op: ValidOp })[];
  job: PushJob;
  conclude(item: Item, outcome: Outcome): void;
}

/** What everything here and everything parked waits for. */
function waitsFor(ops: readonly ValidOp[], parked: ReadonlyMap<string, ParkedRow>): Map<string, readonly string[]> {
  const waits = new Map<string, readonly string[]>();
  for (const { opId, missing } of parked.values()) if (opId !== null) waits.set(opId, missing);
  for (const { opId, deps } of ops) waits.set(opId, deps);
  return waits;
}

/** Outcomes that are clear before anything is read. */
function faultOf({ checked, value }: Item): Outcome | null {
  if (checked.ok) return null;
  const { r, code } = checked.error;
  return r === 'parked'
    ? { r, code, missing: kindToken(memberOf(value, 'kind'), memberOf(value, 'kindV')) }
    : { r, code };
}

async function auditPush({ ctx, counter, transaction, writes }: PushRun, job: PushJob, aside: Aside): Promise<void> {
  const applied = writes.ops.length;
  const digest = createHash('sha256');
  for (const { seq, op_id, body_hash } of writes.ops) digest.update(`${seq}`).update(op_id).update(body_hash);
  const detail = { firstSeq: counter.seq - applied + 1, applied, aside: aside.size, digest: digest.digest('hex') };
  const event = { action: 'push', subjectId: job.deviceId, detail, at: new Date(job.receivedMs) };
  await writeAudit({ ctx, counter, transaction }, event);
}

/** Sorts out what needs no more thought, and makes candidates of the rest. */
function candidatesOf(run: PushRun, parked: ReadonlyMap<string, ParkedRow>, judged: Judged): Candidate[] {
  const { items, job, conclude } = judged;
  const ops = items.map(({ op }) => op);
  const circular = opsInCycles(
    ops.map(({ opId }) => opId),
    waitsFor(ops, parked),
  );
  const mono = opsWithMonoFlag(ops);
  return items.flatMap((item) => {
    const { op } = item;
    if (circular.has(op.opId) && !run.world.ops.has(op.opId)) {
      conclude(item, quarantined('deps'));
      return [];
    }
    const batchFlags: Candidate['batchFlags'] = mono.has(op.opId) ? ['mono'] : [];
    const { ctx: by, deviceId, receivedMs } = job;
    return [{ op, by, deviceId, receivedMs, batchFlags, conclude: (outcome: Outcome) => conclude(item, outcome) }];
  });
}

/** Writes everything, the counter last. A push that changed nothing leaves nothing. */
async function writeAll(run: PushRun, job: PushJob, aside: Aside): Promise<void> {
  await writeRows(run.ctx, run.writes, run.transaction);
  await aside.write(run.ctx, run.transaction);
  if (run.writes.ops.length === 0 && aside.size === 0) return;
  await auditPush(run, job, aside);
  await saveCounter(run.ctx, run.counter, run.transaction);
}

/**
 * One batch in one transaction: all of it stands afterwards, or none. Runs again as a whole when the database asks
 * for it, with the same ids, so that every try has the same effect.
 */
export async function pushTransaction(job: PushJob, transaction: Transaction): Promise<Outcomes> {
  const { ctx, items } = job;
  const run = newRun({ ctx, transaction, counter: await lockCounter(ctx, transaction) }, job.home);
  const aside = new Aside();
  const outcomes: Outcomes = new Map();
  const conclude = (item: Item, outcome: Outcome) => {
    outcomes.set(item.index, outcome);
    keepAside(aside, job, { item, outcome });
  };
  for (const item of items) {
    const fault = faultOf(item);
    if (fault) conclude(item, fault);
  }
  const valid = inOrder(items);
  await loadKnown(
    run,
    valid.map(({ op }) => op),
  );
  const parked = await loadParked(ctx, transaction);
  const candidates = candidatesOf(run, parked, { items: valid, job, conclude });
  const waiting = await reviveParked(run, { parked, waiting: applyAll(run, candidates), aside });
  for (const { candidate, objection } of waiting) candidate.conclude(objection);
  await writeAll(run, job, aside);
  return outcomes;
}
