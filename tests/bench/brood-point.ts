import { getHeapStatistics } from 'node:v8';
import { GENUS_ROW } from '@/lib/brood/durations';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { broodMoves } from '@/lib/brood/hmm/brood-moves';
import { cellModel } from '@/lib/brood/hmm/cell-model';
import { type CellRecord, type HistoryAnswer, historyAnswer } from '@/lib/brood/hmm/history-answer';
import type { BroodReading } from '@/lib/brood/input';
import { broodModel } from '@/lib/brood/nest-model/brood-model';
import { DEFAULT_CONFUSION } from '@/lib/brood/nest-model/confusion';
import { nestHistory } from '@/lib/brood/nest-model/nest-history';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { type DenseAnswer, DenseCore } from '@/tests/support/brood/dense-fast';
import { type NestShape, countGroups, simulatedReadings, simulatedRecords } from './brood-nests';

/** One thing to measure: the whole estimate of a nest, or the core beside the dense implementation. */
export interface Point extends NestShape {
  kind: 'nest' | 'core';
  /** The shortest of so many runs counts. */
  runs: number;
}

/** What was measured at a point. */
export interface Measured {
  seconds: number;
  /** Seconds of processor time, which other programs on the machine do not lengthen. */
  cpu: number;
  /** Cells with a record or a place of their own; what cost is made of. */
  unique: number;
  /** Megabytes: most resident memory of the process before and after, JavaScript heap in use after. */
  rssBefore: number;
  rssPeak: number;
  heap: number;
  dense?: { cpu: number; states: number; logLikGap: number; lawGap: number };
}

const SEED = 2026;
const MB = 1 / 2 ** 20;
/** Day from which a cell of the core may be built, before the first visit. */
const CORE_START = -60;
const ONE_NODE = [1, 1, 1];

/** How long some work took, by the wall and by the processor. */
interface Took {
  seconds: number;
  cpu: number;
}

function timed<T>(work: () => T): Took & { value: T } {
  const [started, before] = [performance.now(), process.cpuUsage()];
  const value = work();
  const { user, system } = process.cpuUsage(before);
  return { seconds: (performance.now() - started) / 1_000, cpu: (user + system) / 1e6, value };
}

function shortest(runs: number, work: () => unknown): Took {
  const all = Array.from({ length: runs }, () => timed(work));
  return { seconds: Math.min(...all.map(({ seconds }) => seconds)), cpu: Math.min(...all.map(({ cpu }) => cpu)) };
}

/** Most resident memory of this process so far. */
function peakRss(): number {
  return process.resourceUsage().maxRSS / 1_024;
}

function estimate(readings: readonly BroodReading[]): unknown {
  const asOf = readings.at(-1)?.at ?? 0;
  return estimateNest({ nest: 'bench', zone: 'UTC', asOf, taxon: null, readings });
}

function measureNest(point: Point): Measured {
  const readings = simulatedReadings(point, SEED);
  const history = nestHistory(readings);
  estimate(simulatedReadings({ cells: 3, visits: 2, gap: 4, isEveryCellUnique: false }, SEED));
  const rssBefore = peakRss();
  const took = shortest(point.runs, () => estimate(readings));
  const heap = getHeapStatistics().used_heap_size * MB;
  return { ...took, unique: history ? countGroups(history) : 0, rssBefore, rssPeak: peakRss(), heap };
}

/** The product's states and moves of a cell, for the core and for the dense implementation. */
function coreModel() {
  const { states, layFirst } = broodModel(GENUS_ROW, DEFAULT_SETTINGS, DEFAULT_CONFUSION);
  const rates = { build: 0.05, layFirst, layNext: DEFAULT_SETTINGS.values.layNext.value };
  const { stages, generations } = states;
  const model = cellModel({
    stages,
    generations,
    rates,
    pieces: [{ from: CORE_START, speeds: ONE_NODE }],
    confusion: DEFAULT_CONFUSION,
    t0: CORE_START,
    startKey: 'N',
  });
  return { model, moves: broodMoves(states, rates) };
}

function largestGap(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let most = a.length === b.length ? 0 : Infinity;
  for (let i = 0; i < Math.min(a.length, b.length); i++) most = Math.max(most, Math.abs((a[i] ?? 0) - (b[i] ?? 0)));
  return most;
}

function gaps(core: readonly HistoryAnswer[], dense: readonly DenseAnswer[]) {
  const pairs = core.map((answer, i) => ({ answer, other: dense[i] }));
  return {
    logLikGap: Math.max(...pairs.map(({ answer, other }) => Math.abs(answer.logLik - (other?.logLik ?? NaN)))),
    lawGap: Math.max(
      ...pairs.map(({ answer, other }) => largestGap(answer.laying?.first ?? [], other?.first ?? [])),
      ...pairs.map(({ answer, other }) =>
        answer.laying?.current ? largestGap(answer.laying.current, other?.current ?? []) : 0,
      ),
    ),
  };
}

function measureCore(point: Point): Measured {
  const { model, moves } = coreModel();
  const times = Array.from({ length: point.visits }, (_, i) => i * point.gap);
  const recordsOf = (shape: NestShape): CellRecord[] =>
    simulatedRecords(shape, SEED).map((classes) => ({
      times,
      observations: classes.map((seen) => (seen === 'opened' ? 'empty' : seen)),
    }));
  const records = recordsOf(point);
  const options = { step: 0.25, daysAfter: [] };
  const answerAll = (some: readonly CellRecord[]) => some.map((record) => historyAnswer(model, record, options));
  const denseAll = (some: readonly CellRecord[]) => {
    const dense = new DenseCore(model, moves, ONE_NODE);
    return some.map((record) => dense.answer(record));
  };
  answerAll(records.slice(0, 3));
  denseAll(records.slice(0, 1));
  const rssBefore = peakRss();
  const core = timed(() => answerAll(records));
  const [rssPeak, heap] = [peakRss(), getHeapStatistics().used_heap_size * MB];
  const dense = timed(() => denseAll(records));
  return {
    seconds: core.seconds,
    cpu: core.cpu,
    unique: records.length,
    rssBefore,
    rssPeak,
    heap,
    dense: { cpu: dense.cpu, states: model.states.count, ...gaps(core.value, dense.value) },
  };
}

/** Measures one point in this process. */
export function measure(point: Point): Measured {
  return point.kind === 'nest' ? measureNest(point) : measureCore(point);
}
