import { poissonMeans, poissonWeights } from '@/lib/brood/poisson';
import type { PassRequest, PassResult } from './power-pass';
import {
  TILE,
  type TilePair,
  type TilePlan,
  addTile,
  column,
  interleave,
  planTile,
  tickMassTile,
  tickValueTile,
} from './tile';
import { BLOCK, type Blocks, type Uniformised, blocksOf, heldBlocks, reachFrom } from './uniformised';

type TileTick = (chain: Uniformised, pair: TilePair, plan: TilePlan) => void;

/** Which blocks are in play while masses move on. */
interface Play {
  used: Blocks;
  plan: TilePlan;
  blocks: Blocks;
}

/** Looks anew at where mass is, before it can have crossed a block; what dropped out is emptied in both tiles. */
function follow(chain: Uniformised, play: Play, { pair, least }: { pair: TilePair; least: number }): void {
  const held = play.blocks.slice();
  heldBlocks(pair.current, held, { least, width: TILE });
  const reach = reachFrom(chain, held);
  let isChanged = false;
  for (let b = 0; b < reach.length; b++) {
    if (reach[b] === 1) play.used[b] = 1;
    if (reach[b] === play.blocks[b]) continue;
    isChanged = true;
    if (reach[b] === 0) pair.next.fill(0, b * BLOCK * TILE, (b + 1) * BLOCK * TILE);
  }
  if (!isChanged) return;
  play.plan = planTile(chain, reach);
  play.blocks = reach;
}

/** Watched sums of every column, tick by tick. */
function noteWatched(
  sequences: readonly Float64Array[],
  watch: NonNullable<PassRequest['watch']>,
  { n, tile }: { n: number; tile: Float64Array },
): void {
  for (let i = 0; i < watch.length; i++) {
    const gate = watch[i]?.gate ?? [];
    for (let c = 0; c < TILE; c++) {
      const sequence = sequences[i * TILE + c];
      let sum = 0;
      for (let g = 0; g < gate.length; g++) {
        const part = gate[g];
        if (part) sum += part[1] * (tile[part[0] * TILE + c] ?? 0);
      }
      if (sequence) sequence[n] = sum;
    }
  }
}

/** One tile's pass. */
function passTile(
  chain: Uniformised,
  vectors: readonly Float64Array[],
  { tick, play, isMoving, request }: TilePass,
): PassResult[] {
  const { days, watch = [], weightsOf = poissonWeights, least = 0 } = request;
  const { first, weights } = weightsOf(chain.clock * days);
  const ticks = first + weights.length;
  const sequences = Array.from({ length: watch.length * TILE }, () => new Float64Array(ticks));
  const size = chain.states * TILE;
  const end = new Float64Array(size);
  const pair: TilePair = {
    current: interleave(vectors, chain.states),
    next: new Float64Array(size),
    sum: end,
    weight: 0,
  };
  if (!isMoving)
    play.blocks.forEach((is, b) => is === 0 && pair.current.fill(0, b * BLOCK * TILE, (b + 1) * BLOCK * TILE));
  for (let n = 0; n < ticks; n++) {
    if (isMoving && n % (BLOCK / 2) === 0) follow(chain, play, { pair, least });
    noteWatched(sequences, watch, { n, tile: pair.current });
    pair.weight = n < first ? 0 : (weights[n - first] ?? 0);
    if (n + 1 === ticks) {
      addTile(pair, play.plan);
      continue;
    }
    tick(chain, pair, play.plan);
    [pair.current, pair.next] = [pair.next, pair.current];
  }
  const laws = watch.map(({ at }) => Array.from(at, (time) => weightsOf(chain.clock * time)));
  return vectors.map((_, c) => ({
    end: column(end, c),
    watched: watch.map((_, i) => poissonMeans(sequences[i * TILE + c] ?? end, laws[i] ?? [])),
    used: play.used,
  }));
}

interface TilePass {
  tick: TileTick;
  play: Play;
  isMoving: boolean;
  request: PassRequest;
}

function standing(vectors: readonly Float64Array[], { watch = [] }: PassRequest, used: Blocks): PassResult[] {
  return vectors.map((vector) => ({
    end: vector.slice(),
    watched: watch.map(({ gate, at }) => {
      const value = gate.reduce((sum, [state, weight]) => sum + weight * (vector[state] ?? 0), 0);
      return new Float64Array(at.length).fill(value);
    }),
    used,
  }));
}

function inTiles(
  vectors: readonly Float64Array[],
  pass: (tile: readonly Float64Array[]) => PassResult[],
): PassResult[] {
  const tiles = Array.from({ length: Math.ceil(vectors.length / TILE) }, (_, i) =>
    vectors.slice(i * TILE, (i + 1) * TILE),
  );
  return tiles.flatMap(pass);
}

/** `massPass` for many vectors at once. */
export function massPasses(chain: Uniformised, masses: readonly Float64Array[], request: PassRequest): PassResult[] {
  if (request.days === 0 || chain.clock === 0) return standing(masses, request, blocksOf(chain, 1));
  return inTiles(masses, (tile) => {
    const blocks = blocksOf(chain, 1);
    const play = { blocks, used: blocksOf(chain, 0), plan: planTile(chain, blocks) };
    return passTile(chain, tile, { tick: tickMassTile, play, isMoving: true, request });
  });
}

/** `valuePass` for many vectors at once, all with the same blocks. */
export function valuePasses(
  chain: Uniformised,
  values: readonly Float64Array[],
  { blocks = blocksOf(chain, 1), ...request }: PassRequest & { blocks?: Blocks },
): PassResult[] {
  if (request.days === 0 || chain.clock === 0) return standing(values, request, blocks);
  const play = { blocks, used: blocks, plan: planTile(chain, blocks) };
  return inTiles(values, (tile) => passTile(chain, tile, { tick: tickValueTile, play, isMoving: false, request }));
}
