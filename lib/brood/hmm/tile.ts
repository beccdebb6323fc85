import { BLOCK, type Blocks, type Uniformised } from './uniformised';

/** Vectors carried side by side: the rates are read once for all of them, which is most of the work. */
export const TILE = 4;

/** Puts up to `TILE` vectors side by side: state by state, one number of each. */
export function interleave(vectors: readonly Float64Array[], states: number): Float64Array {
  const tile = new Float64Array(states * TILE);
  vectors.forEach((vector, c) => {
    for (let s = 0; s < states; s++) tile[s * TILE + c] = vector[s] ?? 0;
  });
  return tile;
}

/** Takes one vector out of a tile. */
export function column(tile: Float64Array, c: number): Float64Array {
  const vector = new Float64Array(tile.length / TILE);
  for (let s = 0; s < vector.length; s++) vector[s] = tile[s * TILE + c] ?? 0;
  return vector;
}

/** Calls back for each run of neighbouring blocks that are in play, in states. */
function runs(blocks: Blocks, states: number): [number, number][] {
  const list: [number, number][] = [];
  for (let b = 0; b < blocks.length; b++) {
    if (blocks[b] === 0) continue;
    const first = b * BLOCK;
    while (blocks[b + 1] === 1) b++;
    list.push([first, Math.min(states, (b + 1) * BLOCK)]);
  }
  return list;
}

/** What a run of ticks with the same blocks works through, in places of the tile. */
export interface TilePlan {
  /** Runs of states in play. */
  runs: readonly (readonly [number, number])[];
  /** Parts of fans in play. */
  fans: readonly { from: number; to: number; target: number; go: number }[];
}

/** Plans ticks: the runs of states, and the parts of fans that lie in them. */
export function planTile({ states, fans }: Uniformised, blocks: Blocks): TilePlan {
  const list = runs(blocks, states);
  const parts = fans.flatMap((fan) =>
    list
      .map(([first, end]) => ({ ...fan, from: Math.max(fan.from, first), to: Math.min(fan.to, end) }))
      .filter(({ from, to }) => from < to),
  );
  return { runs: list, fans: parts };
}

/** A tile before and after a tick, and the sum that the tile before it goes into, so often as `weight` says. */
export interface TilePair {
  current: Float64Array;
  next: Float64Array;
  sum: Float64Array;
  weight: number;
}

/** One tick of four rows of masses. */
export function tickMassTile(chain: Uniformised, pair: TilePair, plan: TilePlan): void {
  if (pair.weight > 0) addTile(pair, plan);
  const { stay, fromPrevious } = chain;
  const { current, next } = pair;
  for (const [first, end] of plan.runs) {
    let k = first * TILE;
    let a = first > 0 ? (current[k - 4] ?? 0) : 0;
    let b = first > 0 ? (current[k - 3] ?? 0) : 0;
    let c = first > 0 ? (current[k - 2] ?? 0) : 0;
    let d = first > 0 ? (current[k - 1] ?? 0) : 0;
    for (let s = first; s < end; s++, k += 4) {
      const here = stay[s] ?? 0;
      const from = fromPrevious[s] ?? 0;
      const w = current[k] ?? 0;
      const x = current[k + 1] ?? 0;
      const y = current[k + 2] ?? 0;
      const z = current[k + 3] ?? 0;
      next[k] = w * here + a * from;
      next[k + 1] = x * here + b * from;
      next[k + 2] = y * here + c * from;
      next[k + 3] = z * here + d * from;
      a = w;
      b = x;
      c = y;
      d = z;
    }
  }
  for (const fan of plan.fans) gather(current, next, fan);
}

function gather(current: Float64Array, next: Float64Array, { from, to, target, go }: TilePlan['fans'][number]): void {
  let a = 0;
  let b = 0;
  let c = 0;
  let d = 0;
  for (let k = from * TILE; k < to * TILE; k += 4) {
    a += current[k] ?? 0;
    b += current[k + 1] ?? 0;
    c += current[k + 2] ?? 0;
    d += current[k + 3] ?? 0;
  }
  const t = target * TILE;
  next[t] = (next[t] ?? 0) + a * go;
  next[t + 1] = (next[t + 1] ?? 0) + b * go;
  next[t + 2] = (next[t + 2] ?? 0) + c * go;
  next[t + 3] = (next[t + 3] ?? 0) + d * go;
}

/** One tick of four columns of values. */
export function tickValueTile(chain: Uniformised, pair: TilePair, plan: TilePlan): void {
  if (pair.weight > 0) addTile(pair, plan);
  const { states, stay, fromPrevious } = chain;
  const { current, next } = pair;
  for (const [first, end] of plan.runs) {
    let k = (end - 1) * TILE;
    const isInside = end < states;
    let share = isInside ? (fromPrevious[end] ?? 0) : 0;
    let a = isInside ? (current[k + 4] ?? 0) : 0;
    let b = isInside ? (current[k + 5] ?? 0) : 0;
    let c = isInside ? (current[k + 6] ?? 0) : 0;
    let d = isInside ? (current[k + 7] ?? 0) : 0;
    for (let s = end - 1; s >= first; s--, k -= 4) {
      const here = stay[s] ?? 0;
      const w = current[k] ?? 0;
      const x = current[k + 1] ?? 0;
      const y = current[k + 2] ?? 0;
      const z = current[k + 3] ?? 0;
      next[k] = w * here + a * share;
      next[k + 1] = x * here + b * share;
      next[k + 2] = y * here + c * share;
      next[k + 3] = z * here + d * share;
      a = w;
      b = x;
      c = y;
      d = z;
      share = fromPrevious[s] ?? 0;
    }
  }
  for (const fan of plan.fans) spread(current, next, fan);
}

function spread(current: Float64Array, next: Float64Array, { from, to, target, go }: TilePlan['fans'][number]): void {
  const t = target * TILE;
  const [a, b, c, d] = [current[t] ?? 0, current[t + 1] ?? 0, current[t + 2] ?? 0, current[t + 3] ?? 0];
  if (a + b + c + d === 0) return;
  const [ga, gb, gc, gd] = [a * go, b * go, c * go, d * go];
  for (let k = from * TILE; k < to * TILE; k += 4) {
    next[k] = (next[k] ?? 0) + ga;
    next[k + 1] = (next[k + 1] ?? 0) + gb;
    next[k + 2] = (next[k + 2] ?? 0) + gc;
    next[k + 3] = (next[k + 3] ?? 0) + gd;
  }
}

/** `sum += weight · current`, in the runs of a plan. */
export function addTile({ sum, weight, current }: TilePair, plan: TilePlan): void {
  for (const [first, end] of plan.runs) {
    const stop = end * TILE;
    for (let k = first * TILE; k < stop; k++) sum[k] = (sum[k] ?? 0) + weight * (current[k] ?? 0);
  }
}
