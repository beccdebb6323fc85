import 'server-only';
import type { Transaction } from 'sequelize';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { describeError, log } from '@/lib/server/log/log';
import { applyOp } from './apply-op';
import type { Candidate } from './candidate';
import { decideOp } from './decide-op';
import { type Decision, type Objection, quarantined } from './decision';
import type { Counter } from './lock-counter';
import { type World, emptyWorld } from './world';
import { type Writes, noWrites } from './writes';

/** One run of a push transaction. A retried transaction starts with a new one. */
export interface PushRun {
  ctx: TeamContext;
  transaction: Transaction;
  counter: Counter;
  world: World;
  writes: Writes;
  /** Ids of operations and entities that came into being in this run. */
  arrived: Set<string>;
}

/** A run in which nothing has happened yet. */
export function newRun(base: Pick<PushRun, 'ctx' | 'transaction' | 'counter'>, home: World['home']): PushRun {
  return { ...base, world: emptyWorld(home), writes: noWrites(), arrived: new Set() };
}

/** An operation that makes our own code fail is set aside like any other bad one, and the rest go on. */
function decideSafely(world: World, candidate: Candidate): Decision {
  try {
    return decideOp(world, candidate);
  } catch (error) {
    log({ event: 'op-failed', ...describeError(error) });
    return quarantined('failed');
  }
}

function apply(run: PushRun, candidate: Candidate, flags: Extract<Decision, { r: 'applied' }>['flags']): void {
  const { world, writes, counter, arrived } = run;
  const { op, by, deviceId, receivedMs, batchFlags } = candidate;
  counter.seq += 1;
  const allFlags = [...flags, ...batchFlags];
  const application = { team: toBinary(run.ctx.teamId), world, writes, op, by, seq: counter.seq };
  applyOp(application, { deviceId, flags: allFlags, receivedMs });
  for (const id of [op.opId, op.nest, op.visit, op.reading]) if (id !== null) arrived.add(id);
  candidate.conclude({ r: 'applied', flags: allFlags, seq: counter.seq });
}

/** An operation that waits for others. */
export interface Waiting {
  candidate: Candidate;
  objection: Extract<Objection, { r: 'parked' }>;
}

function applyOnce(run: PushRun, candidates: readonly Candidate[]): Waiting[] {
  const waiting: Waiting[] = [];
  for (const candidate of candidates) {
    const decision = decideSafely(run.world, candidate);
    if (decision.r === 'applied') apply(run, candidate, decision.flags);
    else if (decision.r === 'parked') waiting.push({ candidate, objection: decision });
    else candidate.conclude(decision);
  }
  return waiting;
}

/**
 * Applies what can be applied, again and again until nothing moves any more: an operation may have arrived before
 * one it depends on.
 *
 * @returns those that still wait for something.
 */
export function applyAll(run: PushRun, candidates: readonly Candidate[]): Waiting[] {
  let waiting = applyOnce(run, candidates);
  let before = candidates.length;
  while (waiting.length > 0 && waiting.length < before) {
    before = waiting.length;
    waiting = applyOnce(
      run,
      waiting.map(({ candidate }) => candidate),
    );
  }
  return waiting;
}
