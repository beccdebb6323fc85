import { STAGES, stageLaws } from '@/lib/brood/stages';
import type { DurationRow } from '@/lib/brood/durations';
import type { Confusion } from '@/lib/brood/hmm/emission';
import type { BroodSettings } from '@/lib/brood/settings';
import { type Dense, denseExp } from './dense-matrix';

/**
 * A second, independent way to what the nest model says of one cell at one value of the nest factor: its own states,
 * its own generator, dense exponentials of a fine step, and the present brood told apart by switching laying off
 * instead of by flows. It shares with the product only the stage laws and the law of the day of building.
 */
export interface DenseCell {
  row: DurationRow;
  settings: BroodSettings;
  confusion: Confusion;
  /** Speed of development: nest factor × rate of the clock. */
  speed: number;
  /** Days of the looks, rising, and what was recorded; null where nobody looked. */
  looks: readonly { day: number; seen: string | null }[];
  /** Day the time begins, and P(not built yet) at any later day. */
  from: number;
  absentAt: (day: number) => number;
}

/** What it says. Days must be whole sixteenths. */
export interface DenseCellAnswer {
  logLik: number;
  /** P(state) by key after each look, given the looks so far. */
  atLooks: Record<string, number>[];
  /** P(first egg laid by the day) given all looks; P(present brood laid by then | alive at the last look). */
  firstBy: (day: number) => number;
  presentBy: (day: number) => number;
}

/** Fine steps a day. */
const FINE = 16;

/** Named states and the rates between them. */
interface CellChain {
  keys: string[];
  classes: string[];
  living: boolean[];
  /** `[from, to, perDay]`, and whether the move lays an egg. */
  moves: { from: number; to: number; rate: number; isLaying: boolean }[];
}

const LOST: Record<string, string> = { egg: 'RMe', pupa: 'RMp' };

function cellChain({ row, settings, speed }: DenseCell): CellChain {
  const { layFirst, layNext, lossEgg, lossLarva, lossCapped, generations } = settings.values;
  const chain: CellChain = { keys: ['B'], classes: ['empty'], living: [false], moves: [] };
  const add = (key: string, className: string, isLiving: boolean) => {
    chain.classes.push(className);
    chain.living.push(isLiving);
    return chain.keys.push(key) - 1;
  };
  let emptied = [0];
  for (let g = 1; g <= generations.value; g++) {
    const phases = stageLaws(row, settings).flatMap((law, i) => {
      const name = STAGES[i] ?? '';
      const larval = name === 'pupa' ? lossCapped.value : lossLarva.value;
      const loss = name === 'egg' ? lossEgg.value : larval;
      return Array.from({ length: law.phases }, () => ({
        ...{ name, loss, rate: (speed * law.phases) / law.meanDays },
        at: add(`${name}#${g}`, name, true),
      }));
    });
    const ends = Object.fromEntries(
      ['EM', 'RMe', 'RMl', 'RMp'].map((end) => [end, add(`${end}#${g}`, end === 'EM' ? 'emerged' : 'empty', false)]),
    );
    const egg = phases[0]?.at ?? 0;
    for (const from of emptied)
      chain.moves.push({ from, to: egg, rate: (g === 1 ? layFirst : layNext).value, isLaying: true });
    phases.forEach(({ at, name, loss, rate }, i) => {
      chain.moves.push({ from: at, to: phases[i + 1]?.at ?? ends.EM ?? 0, rate, isLaying: false });
      chain.moves.push({ from: at, to: ends[LOST[name] ?? 'RMl'] ?? 0, rate: loss, isLaying: false });
    });
    emptied = Object.values(ends);
  }
  return chain;
}

function stepMatrix({ keys, moves }: CellChain, days: number): Dense {
  const n = keys.length;
  const values = new Float64Array(n * n);
  for (const { from, to, rate } of moves) {
    values[from * n + to] = (values[from * n + to] ?? 0) + rate;
    values[from * n + from] = (values[from * n + from] ?? 0) - rate;
  }
  return denseExp({ n, values }, days);
}

function times(v: Float64Array, { n, values }: Dense): Float64Array {
  const out = new Float64Array(n);
  for (let i = 0; i < n; i++)
    for (let j = i; j < n; j++) out[j] = (out[j] ?? 0) + (v[i] ?? 0) * (values[i * n + j] ?? 0);
  return out;
}

function applied({ n, values }: Dense, v: Float64Array): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => {
    let sum = 0;
    for (let j = i; j < n; j++) sum += (values[i * n + j] ?? 0) * (v[j] ?? 0);
    return sum;
  });
}

const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, x, i) => sum + x * (b[i] ?? 0), 0);

/** P(recorded | class), with the share of records that may be anything; eight classes can be recorded. */
function chance({ confusion, settings }: DenseCell, className: string, seen: string): number {
  const floor = settings.values.slipFloor.value;
  return (1 - floor) * (confusion[className]?.[seen] ?? 0) + floor / 8;
}

/** Sums over states of equal key. */
function byKey(keys: readonly string[], mass: Float64Array, absent: number): Record<string, number> {
  const sums: Record<string, number> = { N: absent };
  keys.forEach((key, s) => {
    sums[key] = (sums[key] ?? 0) + (mass[s] ?? 0);
  });
  return sums;
}

/** A cell with its chain and its matrices, and its looks by fine step. */
interface Work {
  cell: DenseCell;
  chain: CellChain;
  whole: Dense;
  half: Dense;
  /** The same without any laying: what is in the cell is then the brood it was. */
  quiet: Dense;
  steps: number;
  looks: ReadonlyMap<number, string | null>;
}

const stepOf = ({ from }: DenseCell, day: number) => Math.round((day - from) * FINE);

function prepared(cell: DenseCell): Work {
  const chain = cellChain(cell);
  const withoutLaying = { ...chain, moves: chain.moves.filter(({ isLaying }) => !isLaying) };
  return {
    cell,
    chain,
    whole: stepMatrix(chain, 1 / FINE),
    half: stepMatrix(chain, 0.5 / FINE),
    quiet: stepMatrix(withoutLaying, 1 / FINE),
    steps: stepOf(cell, cell.looks.at(-1)?.day ?? cell.from),
    looks: new Map(cell.looks.map(({ day, seen }) => [stepOf(cell, day), seen])),
  };
}

/** Multiplies by P(recorded | state). */
function weigh({ cell, chain }: Work, vector: Float64Array, seen: string): Float64Array {
  return vector.map((x, s) => x * chance(cell, chain.classes[s] ?? '', seen));
}

/** Joint masses just before each step's look, the states after each look, and everything at the end. */
function followed(work: Work) {
  const { cell, chain, whole, half, steps, looks } = work;
  const fresh = times(
    Float64Array.from(chain.keys, (_, s) => (s === 0 ? 1 : 0)),
    half,
  );
  let [mass, unbuilt]: [Float64Array, number] = [new Float64Array(chain.keys.length), 1];
  const masses = [mass];
  const atLooks: Record<string, number>[] = [];
  let total = 1;
  for (let i = 1; i <= steps; i++) {
    const [before, after] = [i - 1, i].map((step) => cell.absentAt(cell.from + step / FINE));
    const built = unbuilt * ((before ?? 0) - (after ?? 0));
    mass = times(mass, whole).map((p, s) => p + built * (fresh[s] ?? 0));
    masses.push(mass);
    const seen = looks.get(i);
    if (seen === undefined) continue;
    if (seen !== null) {
      mass = weigh(work, mass, seen);
      unbuilt *= chance(cell, 'absent', seen);
    }
    const absent = unbuilt * (after ?? 0);
    const all = mass.reduce((sum, p) => sum + p, 0) + absent;
    const shares = mass.map((p) => p / all);
    atLooks.push(byKey(chain.keys, shares, absent / all));
    total = all;
  }
  return { masses, atLooks, total, last: mass };
}

/** Values just before each step's look, beside the masses there: P(all that is seen from there on, and `end`). */
function valued(work: Work, end: Float64Array, step: Dense): Float64Array[] {
  let value = end;
  const values = Array<Float64Array>(work.steps + 1);
  for (let i = work.steps; i >= 0; i--) {
    const seen = work.looks.get(i);
    if (seen) value = weigh(work, value, seen);
    values[i] = value;
    value = applied(step, value);
  }
  return values;
}

/** Works one cell out. Looks must lie on fine steps. */
export function denseCell(cell: DenseCell): DenseCellAnswer {
  const work = prepared(cell);
  const { keys, living } = work.chain;
  const { masses, atLooks, total, last } = followed(work);
  const isLiving = Float64Array.from(living, Number);
  const isLaidIn = Float64Array.from(keys, (key) => (key === 'B' ? 0 : 1));
  const any = new Float64Array(keys.length).fill(1);
  const [ofCell, ofBrood] = [valued(work, any, work.whole), valued(work, isLiving, work.quiet)];
  const within = (day: number, states: Float64Array, values: readonly Float64Array[]) => {
    const mass = masses[stepOf(cell, day)]?.map((p, s) => p * (states[s] ?? 0));
    return mass ? dot(mass, values[stepOf(cell, day)] ?? any) : NaN;
  };
  return {
    logLik: Math.log(total),
    atLooks,
    firstBy: (day) => within(day, isLaidIn, ofCell) / total,
    presentBy: (day) => within(day, isLiving, ofBrood) / dot(last, isLiving),
  };
}
