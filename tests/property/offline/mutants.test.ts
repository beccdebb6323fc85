import { afterEach, describe, expect, test, vi } from 'vitest';
import type { SimOptions, SimReport } from '@/tests/support/sim/simulate';

/** A plausible mistake in the protocol, the seeds that must expose it, and the promise it breaks. */
interface Mutant {
  name: string;
  plant?(): void;
  options?: SimOptions;
  /** Most seeds it may survive. */
  seeds: number;
}

const offline = '@/lib/offline';

/** What is replaced at present, so that one mistake does not help the next. */
const planted = new Set<string>();

/** Replaces a module of the core by a wrong version made from the right one. */
function replace<M extends object>(path: string, wrong: (right: M) => Partial<M>): void {
  planted.add(path);
  vi.doMock(path, async (importOriginal) => {
    const right = await importOriginal<M>();
    return { ...right, ...wrong(right) };
  });
}

type Settle = typeof import('@/lib/offline/settle-results');
type Classify = typeof import('@/lib/offline/classify-answer');
type Adopt = typeof import('@/lib/offline/adopt-epoch');
type Commit = typeof import('@/lib/offline/commit-op');
type Pace = typeof import('@/lib/offline/push-pace');
type Purge = typeof import('@/lib/offline/purge');
type Apply = typeof import('@/lib/offline/apply-page');
type Stores = typeof import('@/tests/support/sim/memory-store');

/** Settles whatever the answer says: in the epoch of the answer, not in the phone's. */
function ackFromOldEpoch(): void {
  replace<Settle>(`${offline}/settle-results`, ({ settleResults }) => ({
    settleResults: (settlement) => (before) => {
      if (!before.meta) return settleResults(settlement)(before);
      const { epoch } = before.meta;
      const change = settleResults(settlement)({ ...before, meta: { ...before.meta, epoch: settlement.answer.epoch } });
      return { ...change, meta: change.meta && { ...change.meta, epoch } };
    },
  }));
}

/** Takes every 200 for a success and empties the queue of what was sent. */
function anything200Deletes(): void {
  replace<Classify>(`${offline}/classify-answer`, ({ classifyAnswer }) => ({
    classifyAnswer: (answer, shape) => {
      const verdict = classifyAnswer(answer, shape);
      if (verdict.kind === 'ok' || answer.kind === 'none' || answer.status !== 200) return verdict;
      const made = shape.safeParse({ protocol: 1, epoch: 1, serverTime: '', safeSeq: 0, results: [] });
      return made.success ? { kind: 'ok', value: made.data } : verdict;
    },
  }));
  replace<Settle>(`${offline}/settle-results`, () => ({
    settleResults: () => (before) => {
      const ops = [...before.ops.values()].map((row) => ({ ...row, state: 'held' as const }));
      return { result: ops.length, ops };
    },
  }));
}

function noReoffer(): void {
  replace<Adopt>(`${offline}/adopt-epoch`, ({ adoptEpoch }) => ({
    adoptEpoch: (from, to) => (before) => {
      const change = adoptEpoch(from, to)(before);
      return { ...change, meta: change.meta && { ...change.meta, reofferAfter: null } };
    },
  }));
}

/** Writes the meta row (with the cursor) in one transaction and the rows in the next. */
function cursorBeforeRows(): void {
  replace<Stores>('@/tests/support/sim/memory-store', ({ memoryStore, steadyDisk }) => ({
    memoryStore: (disk, run = steadyDisk) => ({
      ...memoryStore(disk, run),
      transact: async (keys, change) => {
        const made = await run(() => {
          const whole = change(disk.snapshot(keys));
          disk.write({ result: null, meta: whole.meta });
          return whole;
        });
        await run(() => disk.write({ ...made, meta: undefined }));
        return made.result;
      },
    }),
  }));
}

function confirmsEarly(): void {
  replace<Commit>(`${offline}/commit-op`, ({ commitOps }) => ({
    commitOps: async (ports, entry) => {
      void commitOps(ports, entry).catch(() => undefined);
      return [];
    },
  }));
}

function poisonBlocks(): void {
  replace<Pace>(`${offline}/push-pace`, ({ struck }) => ({
    struck: (pace, key) => ({ ...struck(pace, key), hunting: false }),
  }));
  replace<Classify>(`${offline}/classify-answer`, ({ classifyAnswer }) => ({
    classifyAnswer: (answer, shape) => {
      const verdict = classifyAnswer(answer, shape);
      return verdict.kind === 'bad-batch' ? { kind: 'again', trouble: 'office-busy', slow: false, afterMs: null } : verdict;
    },
  }));
}

/** Lets go of an operation as soon as the office has it, backup or not. */
function keepsNothing(): void {
  replace<Purge>(`${offline}/purge`, () => ({
    purge: async ({ store }) => {
      const held = await store.heldAfter('', 1_000);
      const keys = held.map((row) => row.key);
      return store.transact(keys, ({ ops }) => {
        const gone = [...ops.values()].filter((row) => row.state === 'held' && row.seq > 0);
        return { result: gone.length, ops: gone.map((row) => ({ ...row, state: 'remote' as const })) };
      });
    },
  }));
}

/** Takes in a page wherever it starts. */
function anyPage(): void {
  replace<Apply>(`${offline}/apply-page`, ({ applyPage }) => ({
    applyPage: (page) => (before) => {
      if (!before.meta) return applyPage(page)(before);
      const { epoch } = before.meta;
      const meta = { ...before.meta, epoch: page.start.epoch, cursor: page.start.cursor };
      const change = applyPage(page)({ ...before, meta });
      return { ...change, meta: change.meta && { ...change.meta, epoch } };
    },
  }));
}

const RESTORES = { restoreEveryMs: 15_000, backupEveryMs: 8_000 };
const FROZEN_TABS = { ...RESTORES, freezeEveryMs: 6_000, slow: 0.3, lost: 0.3, crashEveryMs: Infinity };

const MUTANTS: readonly Mutant[] = [
  { name: 'an ack from an old epoch counts', plant: ackFromOldEpoch, options: { weather: FROZEN_TABS, twoTabs: true }, seeds: 400 },
  { name: 'the office does not tell repeated operations', options: { serverFault: 'no-dedupe' }, seeds: 20 },
  { name: 'any 200 empties the queue', plant: anything200Deletes, seeds: 20 },
  { name: 'nothing is offered again after a restore', plant: noReoffer, options: { weather: RESTORES }, seeds: 20 },
  { name: 'the office numbers rows before it commits them', options: { serverFault: 'cursor-by-start-order' }, seeds: 40 },
  { name: 'the cursor is written before the rows', plant: cursorBeforeRows, seeds: 40 },
  { name: 'saved is shown before the transaction completes', plant: confirmsEarly, seeds: 40 },
  { name: 'the office answers before it commits', options: { serverFault: 'ack-before-commit' }, seeds: 40 },
  { name: 'operations are named by device and counter', options: { countedIds: true, twoTabs: true, weather: { clone: 1 } }, seeds: 40 },
  { name: 'a poisonous operation holds up its batch', plant: poisonBlocks, options: { weather: { poison: 0.05 } }, seeds: 20 },
  { name: 'nothing is kept once the office has it', plant: keepsNothing, options: { weather: RESTORES }, seeds: 20 },
  { name: 'a page is taken in wherever it starts', plant: anyPage, options: { weather: FROZEN_TABS, twoTabs: true }, seeds: 400 },
];

/** Plays seeds until one is broken. */
async function firstBroken({ options, seeds }: Mutant): Promise<SimReport | null> {
  const { simulate } = await import('@/tests/support/sim/simulate');
  for (let seed = 1; seed <= seeds; seed++) {
    const report = await simulate(seed, options);
    if (report.violations.length > 0) return report;
  }
  return null;
}

describe('the simulation notices when', () => {
  afterEach(() => {
    for (const path of planted) vi.doUnmock(path);
    planted.clear();
    vi.resetModules();
  });

  test.each(MUTANTS)('$name', { timeout: 120_000 }, async (mutant) => {
    vi.resetModules();
    mutant.plant?.();
    const broken = await firstBroken(mutant);
    console.log(mutant.name, broken?.seed, broken?.violations.slice(0, 2));
    expect(broken?.violations).not.toHaveLength(0);
    expect(broken).not.toBeNull();
  });
});
