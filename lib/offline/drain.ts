import { adoptEpoch } from './adopt-epoch';
import type { DrainEnd, DrainPorts, StepEnd } from './drain-ports';
import { enrolDevice, officeEpoch } from './enrol-device';
import { type HeldLease, withLease } from './lease';
import { pullPages } from './pull-pages';
import { purge } from './purge';
import { newPace } from './push-pace';
import { pushQueue } from './push-queue';
import { reoffer } from './reoffer';
import { retrySuspects } from './retry-suspects';
import type { Change, Snapshot } from './store';

/** What a person may ask of a pass. */
export interface DrainWish {
  /** Try the operations again that the office fails over, due or not. */
  all: boolean;
}

/** One pass of the drain. Never rejects: a failing storage ends it like a failing network. */
export type Drain = (wish: DrainWish) => Promise<DrainEnd>;

/** A pass meets at most this many restores before it rests. */
const ROUNDS = 4;

const LATER: DrainEnd = { kind: 'again', trouble: null, afterMs: null };

/** Notes when the office confirmed that nothing waits. */
function noteSync(now: number) {
  return ({ meta }: Snapshot): Change<void> => ({
    result: undefined,
    meta: meta ? { ...meta, lastSync: now } : undefined,
  });
}

async function finish(ports: DrainPorts): Promise<DrainEnd> {
  const { queued } = await ports.store.counts();
  if (queued === 0) await ports.store.transact([], noteSync(ports.clock.now()));
  await purge(ports);
  return { kind: 'done' };
}

/** Moves to the epoch that an answer named, or that the office names when asked. */
async function moveEpoch(ports: DrainPorts, { from, epoch }: { from: number; epoch: number | null }): Promise<boolean> {
  const to = epoch ?? (await officeEpoch(ports));
  if (to === null) return false;
  await ports.store.transact([], adoptEpoch(from, to));
  return true;
}

/**
 * A restore may have forgotten this phone: then it enrols again. A device that the office of this epoch has known was
 * withdrawn on purpose and stays withdrawn.
 */
async function wasForgotten(ports: DrainPorts): Promise<boolean> {
  if (!ports.enrols) return false;
  const meta = await ports.store.readMeta();
  const epoch = await officeEpoch(ports);
  return meta !== null && epoch !== null && epoch !== meta.deviceEpoch;
}

/** Makes the drain of one tab. It keeps its pace from pass to pass. */
export function createDrain(ports: DrainPorts): Drain {
  const pace = { value: newPace() };

  async function steps(lease: HeldLease, wish: DrainWish): Promise<StepEnd> {
    const meta = await ports.store.readMeta();
    if (!meta) return { kind: 'cleared' };
    return (
      (meta.deviceId === null && ports.enrols ? await enrolDevice(ports) : null) ??
      (await reoffer(ports, lease)) ??
      (await pushQueue(ports, lease, pace)) ??
      (await retrySuspects(ports, lease, wish.all)) ??
      (await pullPages(ports, lease))
    );
  }

  async function pass(lease: HeldLease, wish: DrainWish): Promise<DrainEnd> {
    for (let round = 1; round <= ROUNDS; round++) {
      const end = await steps(lease, wish);
      if (end === null) return finish(ports);
      if (end.kind === 'epoch') {
        if (!(await moveEpoch(ports, end))) return LATER;
      } else if (end.kind === 'revoked' && (await wasForgotten(ports))) {
        const refused = await enrolDevice(ports);
        if (refused) return refused.kind === 'epoch' ? LATER : refused;
      } else return end;
    }
    return LATER;
  }

  return async (wish) => {
    try {
      const end = await withLease(ports, (lease) => pass(lease, wish));
      return end ?? { kind: 'elsewhere' };
    } catch {
      await ports.store.reopen().catch(() => undefined);
      return LATER;
    } finally {
      ports.report(null);
    }
  };
}
