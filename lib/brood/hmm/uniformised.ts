import type { Transitions } from './transitions';

/** Moves from every state of `from` … `to − 1` into one target, all with one probability at a tick. */
interface Fan {
  from: number;
  to: number;
  target: number;
  go: number;
}

/**
 * A generator as a discrete chain with Poisson ticks: v·exp(Q t) = Σ Poisson(n; clock · t) · v (I + Q / clock)ⁿ.
 * All terms are non-negative, so nothing cancels.
 *
 * Brood chains mostly move from a state to the one numbered next, so those moves are one dense row; what is left are
 * few fans: all phases of a stage that are lost into one end. A tick is then a handful of plain loops.
 */
export interface Uniformised {
  states: number;
  /** Ticks a day: the largest rate of leaving any state. */
  clock: number;
  /** Probability of staying at a tick, by state. */
  stay: Float64Array;
  /** Probability of coming from the state numbered one less, by state. */
  fromPrevious: Float64Array;
  fans: readonly Fan[];
}

/** All moves at given speeds of the clocks: the sum over clocks of speed × rate. */
function rateOfMoves(moves: Transitions, speeds: readonly number[]): Float64Array {
  const go = new Float64Array(moves.source.length);
  moves.rates.forEach((rates, clock) => {
    const speed = speeds[clock] ?? 0;
    for (let i = 0; i < go.length; i++) go[i] = (go[i] ?? 0) + speed * (rates[i] ?? 0);
  });
  return go;
}

/** Joins moves into one target from states in a row, with one probability, to fans. */
function fansOf({ source, target }: Transitions, go: Float64Array): Fan[] {
  const others = Array.from(go.keys()).filter((i) => go[i] !== 0 && target[i] !== (source[i] ?? 0) + 1);
  const sorted = others.sort((a, b) => (target[a] ?? 0) - (target[b] ?? 0) || (source[a] ?? 0) - (source[b] ?? 0));
  const fans: Fan[] = [];
  for (const i of sorted) {
    const [from, to, share] = [source[i] ?? 0, target[i] ?? 0, go[i] ?? 0];
    const last = fans.at(-1);
    if (last?.target === to && last.to === from && last.go === share) last.to += 1;
    else fans.push({ from, to: from + 1, target: to, go: share });
  }
  return fans;
}

/** The generator at given speeds of the clocks, uniformised. */
export function uniformise(moves: Transitions, speeds: readonly number[]): Uniformised {
  const rates = rateOfMoves(moves, speeds);
  const { states, source, target } = moves;
  const leave = new Float64Array(states);
  rates.forEach((rate, i) => {
    const from = source[i] ?? 0;
    leave[from] = (leave[from] ?? 0) + rate;
  });
  const clock = leave.reduce((most, rate) => Math.max(most, rate), 0);
  const fromPrevious = new Float64Array(states);
  if (clock === 0) return { states, clock, stay: leave.fill(1), fromPrevious, fans: [] };
  const go = rates.map((rate) => rate / clock);
  go.forEach((share, i) => {
    const to = target[i] ?? 0;
    if (to === (source[i] ?? 0) + 1) fromPrevious[to] = share;
  });
  return { states, clock, stay: leave.map((rate) => 1 - rate / clock), fromPrevious, fans: fansOf(moves, go) };
}

/** States are handled in blocks of this many; a block without mass is passed over, neighbours are one loop. */
const BLOCK_BITS = 4;

/** States of one block. */
export const BLOCK = 1 << BLOCK_BITS;

/** Which blocks of states hold anything: 1 where they do. */
export type Blocks = Uint8Array;

/** Blocks for a chain, all set to `value`. */
export function blocksOf({ states }: Pick<Uniformised, 'states'>, value: 0 | 1): Blocks {
  return new Uint8Array(((states - 1) >> BLOCK_BITS) + 1).fill(value);
}

/** One step of a vector: from `current` to `next`, which it overwrites in these blocks; elsewhere both are 0. */
export type Tick = (chain: Uniformised, vectors: { current: Float64Array; next: Float64Array }, blocks: Blocks) => void;

/** One tick of a row of masses: `next = mass (I + Q / clock)`. */
export const tickMass: Tick = ({ states, stay, fromPrevious, fans }, { current, next }, blocks) => {
  for (let b = 0; b < blocks.length; b++) {
    if (blocks[b] === 0) continue;
    const first = b << BLOCK_BITS;
    while (blocks[b + 1] === 1) b++;
    const end = Math.min(states, (b + 1) << BLOCK_BITS);
    let before = first > 0 ? (current[first - 1] ?? 0) : 0;
    for (let s = first; s < end; s++) {
      const here = current[s] ?? 0;
      next[s] = here * (stay[s] ?? 0) + before * (fromPrevious[s] ?? 0);
      before = here;
    }
  }
  for (const { from, to, target, go } of fans) {
    let sum = 0;
    for (let b = from >> BLOCK_BITS; b <= (to - 1) >> BLOCK_BITS; b++) {
      if (blocks[b] === 0) continue;
      const first = b << BLOCK_BITS;
      while (blocks[b + 1] === 1) b++;
      const end = Math.min(to, (b + 1) << BLOCK_BITS);
      for (let s = Math.max(from, first); s < end; s++) sum += current[s] ?? 0;
    }
    if (sum > 0) next[target] = (next[target] ?? 0) + sum * go;
  }
};

/** One tick of a column of values: `next = (I + Q / clock) value`. */
export const tickValue: Tick = ({ states, stay, fromPrevious, fans }, { current, next }, blocks) => {
  for (let b = blocks.length - 1; b >= 0; b--) {
    if (blocks[b] === 0) continue;
    const end = Math.min(states, (b + 1) << BLOCK_BITS);
    while (b > 0 && blocks[b - 1] === 1) b--;
    const first = b << BLOCK_BITS;
    let after = end < states ? (current[end] ?? 0) : 0;
    let share = end < states ? (fromPrevious[end] ?? 0) : 0;
    for (let s = end - 1; s >= first; s--) {
      const here = current[s] ?? 0;
      next[s] = here * (stay[s] ?? 0) + after * share;
      after = here;
      share = fromPrevious[s] ?? 0;
    }
  }
  for (const { from, to, target, go } of fans) {
    const gain = (current[target] ?? 0) * go;
    if (gain === 0) continue;
    for (let b = from >> BLOCK_BITS; b <= (to - 1) >> BLOCK_BITS; b++) {
      if (blocks[b] === 0) continue;
      const first = b << BLOCK_BITS;
      while (blocks[b + 1] === 1) b++;
      const end = Math.min(to, (b + 1) << BLOCK_BITS);
      for (let s = Math.max(from, first); s < end; s++) next[s] = (next[s] ?? 0) + gain;
    }
  }
};

/** `sum += weight · vector`, in these blocks. */
export function addScaled(
  sum: Float64Array,
  { vector, weight }: { vector: Float64Array; weight: number },
  blocks: Blocks,
): void {
  for (let b = 0; b < blocks.length; b++) {
    if (blocks[b] === 0) continue;
    const first = b << BLOCK_BITS;
    while (blocks[b + 1] === 1) b++;
    const end = Math.min(sum.length, (b + 1) << BLOCK_BITS);
    for (let s = first; s < end; s++) sum[s] = (sum[s] ?? 0) + weight * (vector[s] ?? 0);
  }
}

/** Marks the blocks of a vector (or of `width` of them side by side) that hold more than `least`; others are emptied. */
export function heldBlocks(
  vector: Float64Array,
  blocks: Blocks,
  { least, width = 1 }: { least: number; width?: number },
): void {
  for (let b = 0; b < blocks.length; b++) {
    if (blocks[b] === 0) continue;
    const [first, end] = [b * BLOCK * width, Math.min(vector.length, (b + 1) * BLOCK * width)];
    let most = 0;
    for (let s = first; s < end; s++) most = Math.max(most, vector[s] ?? 0);
    if (most > least) continue;
    vector.fill(0, first, end);
    blocks[b] = 0;
  }
}

/** Adds every block that can be reached within `BLOCK` ticks: the next ones, and those that fans lead to. */
export function reachFrom({ fans }: Uniformised, held: Blocks): Blocks {
  const reach = held.slice();
  held.forEach((isHeld, b) => {
    if (isHeld === 1 && b + 1 < reach.length) reach[b + 1] = 1;
  });
  for (let grown = true; grown;) {
    grown = false;
    for (const { from, to, target } of fans) {
      const into = target >> BLOCK_BITS;
      if (reach[into] === 1 && reach[Math.min(into + 1, reach.length - 1)] === 1) continue;
      if (!reach.subarray(from >> BLOCK_BITS, ((to - 1) >> BLOCK_BITS) + 1).includes(1)) continue;
      reach.fill(1, into, into + 2);
      grown = true;
    }
  }
  return reach;
}

/** Adds the blocks of `more` to `blocks`. */
export function joinBlocks(blocks: Blocks, more: Blocks): void {
  for (let b = 0; b < blocks.length; b++) blocks[b] = (blocks[b] ?? 0) | (more[b] ?? 0);
}
