import type { CellModel } from '@/lib/brood/hmm/cell-model';
import { likelihoodOf } from '@/lib/brood/hmm/emission';
import type { CellRecord } from '@/lib/brood/hmm/history-answer';
import { type Dense, denseExp, denseGenerator, power, subMatrix } from './dense-matrix';

/** What the dense implementation says of one record: the same things the product's core says. */
export interface DenseAnswer {
  logLik: number;
  /** Smoothed state probabilities at each visit. */
  smoothed: Float64Array[];
  /** P(first egg laid by each quarter day), and P(present brood laid by then | alive at the last visit). */
  first: Float64Array;
  current: Float64Array;
}

const STEP = 0.25;

/** Everything about one gap between visits that all records share. */
interface Interval {
  steps: number;
  whole: Dense;
  /** Flow of laying k steps after the earlier visit, as a functional of the masses there. */
  laying: Float64Array[];
  /** Value of the brood's first phase k steps before the later visit, as a functional of the values there. */
  brood: Float64Array[];
  /** Rows of the states without an egg yet: masses among themselves k steps on, and values from k steps before. */
  unlaidMass: Float64Array[][];
  unlaidValue: Float64Array[][];
  broodWhole: Dense;
}

/** Column functionals: entry s of item k is the flow after k steps of a unit mass that began in s. */
function columns(step: Dense, first: Float64Array, count: number): Float64Array[] {
  const all = [first];
  while (all.length < count) all.push(multiplyRight(step, all.at(-1) ?? first));
  return all;
}

/** Row functionals: entry s of item k is the mass in s after k steps. */
function rows(step: Dense, first: Float64Array, count: number): Float64Array[] {
  const all = [first];
  while (all.length < count) all.push(multiplyLeft(all.at(-1) ?? first, step));
  return all;
}

/** P · v. */
function multiplyRight({ n, values }: Dense, v: Float64Array): Float64Array {
  const result = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let sum = 0;
    const row = i * n;
    for (let j = 0; j < n; j++) sum += (values[row + j] as number) * (v[j] as number);
    result[i] = sum;
  }
  return result;
}

/** v · P. */
function multiplyLeft(v: Float64Array, { n, values }: Dense): Float64Array {
  const result = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const x = v[i] as number;
    if (x === 0) continue;
    const row = i * n;
    for (let j = 0; j < n; j++) result[j] = (result[j] as number) + x * (values[row + j] as number);
  }
  return result;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] as number) * (b[i] as number);
  return sum;
}

/** Values weighed with what a visit saw: of the cell, and of one brood that lives to the last visit. */
interface Weighed {
  cell: Float64Array;
  brood: Float64Array;
}

function unit(n: number, at: number): Float64Array {
  const v = new Float64Array(n);
  v[at] = 1;
  return v;
}

/** The dense implementation of one model, with the matrices of every gap that comes up made once. */
export class DenseCore {
  private readonly n: number;
  private readonly step: Dense;
  private readonly broodStep: Dense;
  private readonly flow: Float64Array;
  private readonly intervals = new Map<number, Interval>();

  /** @param speeds of the clocks, the same at all times. */
  constructor(
    private readonly model: CellModel,
    moves: Parameters<typeof denseGenerator>[0],
    speeds: readonly number[],
  ) {
    this.n = model.states.count;
    const generator = denseGenerator(moves, speeds);
    this.step = denseExp(generator, STEP);
    const size = model.broodLiving.length;
    this.broodStep = denseExp(subMatrix(generator, model.broodOffset, model.broodOffset + size), STEP);
    this.flow = new Float64Array(this.n);
    for (const [state, weight] of model.layingGate(speeds)) this.flow[state] = weight;
  }

  private interval(steps: number): Interval {
    const known = this.intervals.get(steps);
    if (known) return known;
    const { model, n, step, broodStep } = this;
    const made: Interval = {
      steps,
      whole: power(step, steps),
      laying: columns(step, this.flow, steps + 1),
      brood: rows(broodStep, unit(broodStep.n, 0), steps + 1),
      unlaidMass: model.unlaid.map((s) => columns(step, unit(n, s), steps + 1)),
      unlaidValue: model.unlaid.map((s) => rows(step, unit(n, s), steps + 1)),
      broodWhole: power(broodStep, steps),
    };
    this.intervals.set(steps, made);
    return made;
  }

  /** Works a record out; its times must be whole quarter days. */
  answer({ times, observations }: CellRecord): DenseAnswer {
    const { model, n } = this;
    const likelihoods = observations.map(
      (seen) => likelihoodOf(seen, model.confusion, model.states.classes) ?? new Float64Array(n).fill(1),
    );
    const starts = [model.start.time, ...times];
    const gaps = times.map((time, i) => this.interval(Math.round((time - (starts[i] ?? 0)) / STEP)));
    const forward = this.forward(gaps, likelihoods);
    const backward = this.backward(gaps, likelihoods);
    const smoothed = times.map((_, i) => {
      const product = (forward.after[i] ?? forward.last).map(
        (p, s) => p * ((backward.values[i] as Float64Array)[s] ?? 0),
      );
      const total = product.reduce((sum, p) => sum + p, 0);
      return product.map((p) => p / total);
    });
    return { logLik: forward.logLik, smoothed, ...this.laying(gaps, forward.before, backward) };
  }

  private forward(gaps: readonly Interval[], likelihoods: readonly Float64Array[]) {
    let mass = this.model.start.mass;
    let logLik = 0;
    const [before, after]: [Float64Array[], Float64Array[]] = [[], []];
    gaps.forEach(({ whole }, i) => {
      before.push(mass);
      const seen = likelihoods[i] as Float64Array;
      const next = multiplyLeft(mass, whole).map((p, s) => p * (seen[s] as number));
      const total = next.reduce((sum, p) => sum + p, 0);
      logLik += Math.log(total);
      mass = next.map((p) => p / total);
      after.push(mass);
    });
    return { before, after, last: mass, logLik };
  }

  /** Values just after each visit, and weighed ones just before it. */
  private backward(gaps: readonly Interval[], likelihoods: readonly Float64Array[]) {
    const { broodOffset, broodLiving } = this.model;
    let value: Float64Array = new Float64Array(this.n).fill(1);
    let brood: Float64Array = broodLiving;
    const values: Float64Array[] = [];
    const weighed: Weighed[] = [];
    for (let i = gaps.length - 1; i >= 0; i--) {
      const seen = likelihoods[i] as Float64Array;
      const { whole, broodWhole } = gaps[i] as Interval;
      values.unshift(value);
      const cell = value.map((v, s) => v * (seen[s] as number));
      const ofBrood = brood.map((v, s) => v * (seen[s + broodOffset] as number));
      weighed.unshift({ cell, brood: ofBrood });
      // A common factor keeps the numbers in range; the laws are scaled at the end.
      const scale = 1 / Math.max(...cell, Number.MIN_VALUE);
      value = multiplyRight(whole, cell).map((v) => v * scale);
      brood = multiplyRight(broodWhole, ofBrood).map((v) => v * scale);
    }
    return { values, weighed };
  }

  private laying(
    gaps: readonly Interval[],
    before: readonly Float64Array[],
    { weighed }: ReturnType<DenseCore['backward']>,
  ): Pick<DenseAnswer, 'first' | 'current'> {
    const first: number[] = [];
    const current = [0];
    gaps.forEach((gap, i) => {
      const mass = before[i] as Float64Array;
      const { cell, brood } = weighed[i] as Weighed;
      const whole = dot(multiplyLeft(mass, gap.whole), cell);
      let earlier = NaN;
      for (let k = 0; k <= gap.steps; k++) {
        const left = gap.steps - k;
        const flow = (dot(gap.laying[k] as Float64Array, mass) * dot(gap.brood[left] as Float64Array, brood)) / whole;
        if (k > 0) current.push((current.at(-1) ?? 0) + (earlier + flow) / 2);
        earlier = flow;
        if (k === 0 && i > 0) continue;
        const still = gap.unlaidMass.reduce(
          (sum, at, u) =>
            sum + dot(at[k] as Float64Array, mass) * dot(gap.unlaidValue[u]?.[left] as Float64Array, cell),
          0,
        );
        first.push(1 - still / whole);
      }
    });
    const total = current.at(-1) ?? 0;
    return { first: Float64Array.from(first), current: Float64Array.from(current, (x) => x / total) };
  }
}
