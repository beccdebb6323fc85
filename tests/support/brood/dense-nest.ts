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

/** Works one cell out. Looks must lie on fine steps. */
export function denseCell(cell: DenseCell): DenseCellAnswer {
  const chain = cellChain(cell);
  const n = chain.keys.length;
  const last = cell.looks.at(-1)?.day ?? cell.from;
  const steps = Math.round((last - cell.from) * FINE);
  const lookAt = new Map(cell.looks.map(({ day, seen }) => [Math.round((day - cell.from) * FINE), seen]));
  const [whole, half] = [stepMatrix(chain, 1 / FINE), stepMatrix(chain, 0.5 / FINE)];
  const quiet = stepMatrix({ ...chain, moves: chain.moves.filter(({ isLaying }) => !isLaying) }, 1 / FINE);
  const likelihood = (seen: string) => Float64Array.from(chain.classes, (name) => chance(cell, name, seen));
  const built = new Float64Array(n);
  built[0] = 1;
  const fresh = times(built, half);

  let [mass, unbuilt]: [Float64Array, number] = [new Float64Array(n), 1];
  const atLooks: Record<string, number>[] = [];
  const forward = [mass];
  for (let i = 1; i <= steps; i++) {
    const [before, after] = [cell.absentAt(cell.from + (i - 1) / FINE), cell.absentAt(cell.from + i / FINE)];
    mass = times(mass, whole).map((p, s) => p + unbuilt * (before - after) * (fresh[s] ?? 0));
    // Both sides of a look are needed: the masses after it here, the looks themselves in the values.
    forward.push(mass);
    const seen = lookAt.get(i);
    if (seen === undefined) continue;
    if (seen !== null) {
      const weight = likelihood(seen);
      mass = mass.map((p, s) => p * (weight[s] ?? 0));
      unbuilt *= chance(cell, 'absent', seen);
    }
    const total = mass.reduce((sum, p) => sum + p, 0) + unbuilt * after;
    atLooks.push(
      byKey(
        chain.keys,
        mass.map((p) => p / total),
        (unbuilt * after) / total,
      ),
    );
  }
  const total = mass.reduce((sum, p) => sum + p, 0) + unbuilt * cell.absentAt(last);

  const living = Float64Array.from(chain.living, Number);
  const values = { cell: Array<Float64Array>(steps + 1), brood: Array<Float64Array>(steps + 1) };
  let [ofCell, ofBrood]: Float64Array[] = [new Float64Array(n).fill(1), living];
  for (let i = steps; i >= 0; i--) {
    const seen = lookAt.get(i);
    if (seen) {
      const weight = likelihood(seen);
      ofCell = (ofCell as Float64Array).map((v, s) => v * (weight[s] ?? 0));
      ofBrood = (ofBrood as Float64Array).map((v, s) => v * (weight[s] ?? 0));
    }
    // Values just before the look at this step, beside masses just before it.
    values.cell[i] = ofCell as Float64Array;
    values.brood[i] = ofBrood as Float64Array;
    ofCell = applied(whole, ofCell as Float64Array);
    ofBrood = applied(quiet, ofBrood as Float64Array);
  }
  const alive = dot(mass, living);
  const index = (day: number) => Math.round((day - cell.from) * FINE);
  const laid = Float64Array.from(chain.keys, (key) => (key === 'B' ? 0 : 1));
  return {
    logLik: Math.log(total),
    atLooks,
    firstBy: (day) =>
      dot(forward[index(day)]?.map((p, s) => p * (laid[s] ?? 0)) ?? built, values.cell[index(day)] ?? built) / total,
    presentBy: (day) =>
      dot(forward[index(day)]?.map((p, s) => p * (living[s] ?? 0)) ?? built, values.brood[index(day)] ?? built) / alive,
  };
}
