import type { Gate } from '@/lib/brood/hmm/power-pass';
import { valuePasses } from '@/lib/brood/hmm/tile-pass';
import { type Blocks, type Uniformised, blocksOf, joinBlocks } from '@/lib/brood/hmm/uniformised';
import type { NestKernel } from './nest-kernel';
import type { Segment } from './timeline';

/** Values by step of one segment, with the logarithm of what was divided out after it. */
export interface BackwardPart {
  /** P(all later looks | egg laid in the step), for the first egg of the cell. */
  firstEgg: Float64Array;
  firstLog: number;
  /** P(all later looks, and this brood alive at the last | egg laid in the step). */
  presentEgg: Float64Array;
  /** The same for brood capped in the step. */
  presentCapped: Float64Array;
  presentLog: number;
}

/** A record to follow backward from its last look. */
export interface BackwardRecord {
  seen: readonly (Float64Array | null)[];
  /** For each segment up to the last look, the blocks of states that masses ever were in. */
  used: readonly Blocks[];
}

/** Values weighed by what was seen and divided by the largest of them, and the logarithm of that. */
function weighed(value: Float64Array, likelihood: Float64Array | null | undefined, offset: number) {
  const values = new Float64Array(value.length);
  let most = 0;
  for (let s = 0; s < values.length; s++) {
    const weight = likelihood ? (likelihood[s + offset] ?? 0) : 1;
    const v = (value[s] ?? 0) * weight;
    values[s] = v;
    if (v > most) most = v;
  }
  if (!(most > 0)) return { values, log: 0 };
  for (let s = 0; s < values.length; s++) values[s] = (values[s] ?? 0) / most;
  return { values, log: Math.log(most) };
}

/** One kind of backward pass. */
interface PassKind {
  kernel: NestKernel;
  terminal: Float64Array;
  chain: (rate: number) => Uniformised;
  gates: readonly Gate[];
  /** Number of the first state of the chain among all states. */
  offset: number;
  isWhole: boolean;
}

/** The blocks that the records need in a segment, all together. */
function neededBlocks(records: readonly BackwardRecord[], segment: number, chain: Uniformised): Blocks {
  const blocks = blocksOf(chain, 0);
  for (const { used } of records) joinBlocks(blocks, used[segment] ?? blocks);
  return blocks;
}

/** What a pass says of one segment of one record. */
type Watched = { log: number; watched: Float64Array[] };

/** Follows records through all segments, last first, side by side; each begins at its own last look. */
function pass(segments: readonly Segment[], records: readonly BackwardRecord[], kind: PassKind): Watched[][] {
  const walks = records.map((record) => ({ record, value: kind.terminal, log: 0, parts: [] as Watched[] }));
  for (const [i, segment] of [...segments.entries()].reverse()) {
    const open = walks.filter(({ record }) => i < record.used.length);
    const { days, steps, rate, look } = segment;
    const chain = kind.chain(rate);
    const starts = open.map((walk) => {
      const seen = look === null ? null : walk.record.seen[look];
      const start = weighed(walk.value, seen, kind.offset);
      walk.log += start.log;
      return start.values;
    });
    const at = Float64Array.from({ length: steps }, (_, k) => days - ((k + 0.5) * days) / steps);
    const results = valuePasses(chain, starts, {
      days,
      watch: kind.gates.map((gate) => ({ gate, at })),
      weightsOf: kind.kernel.weightsOf,
      ...(kind.isWhole
        ? {
            blocks: neededBlocks(
              open.map(({ record }) => record),
              i,
              chain,
            ),
          }
        : {}),
    });
    open.forEach((walk, k) => {
      walk.value = results[k]?.end ?? walk.value;
      walk.parts.unshift({ log: walk.log, watched: results[k]?.watched ?? [] });
    });
  }
  return walks.map(({ parts }) => parts);
}

/** Follows records backward: for the cell as a whole, and for the one brood that is alive at the end. */
export function backwardCells(
  kernel: NestKernel,
  segments: readonly Segment[],
  records: readonly BackwardRecord[],
): BackwardPart[][] {
  const { model } = kernel;
  const whole = pass(segments, records, {
    kernel,
    terminal: new Float64Array(model.states.count).fill(1),
    chain: kernel.full,
    gates: [[[model.eggState, 1]]],
    offset: 0,
    isWhole: true,
  });
  const present = pass(segments, records, {
    kernel,
    terminal: model.broodLiving,
    chain: kernel.brood,
    gates: [[[0, 1]], [[model.pupaPhase, 1]]],
    offset: model.eggState,
    isWhole: false,
  });
  return records.map(({ used }, r) =>
    used.map((_, i) => ({
      firstEgg: whole[r]?.[i]?.watched[0] ?? new Float64Array(0),
      firstLog: whole[r]?.[i]?.log ?? 0,
      presentEgg: present[r]?.[i]?.watched[0] ?? new Float64Array(0),
      presentCapped: present[r]?.[i]?.watched[1] ?? new Float64Array(0),
      presentLog: present[r]?.[i]?.log ?? 0,
    })),
  );
}
