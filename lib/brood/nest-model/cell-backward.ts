import type { Gate } from '@/lib/brood/hmm/power-pass';
import { TILE } from '@/lib/brood/hmm/tile';
import { valuePasses } from '@/lib/brood/hmm/tile-pass';
import { type Blocks, type Uniformised, blocksOf, joinBlocks } from '@/lib/brood/hmm/uniformised';
import { firstSegmentValues } from './first-segment';
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

/** What a pass says of one segment of one record; of the first one only the values at its end. */
interface Watched {
  log: number;
  watched: Float64Array[];
  end: Float64Array;
}

/** A record on its way back. */
interface Walk {
  record: BackwardRecord;
  value: Float64Array;
  log: number;
  parts: Watched[];
}

/** Takes the look at the end of a segment into account. */
function weighLook(walk: Walk, { look }: Segment, offset: number): Float64Array {
  const start = weighed(walk.value, look === null ? null : walk.record.seen[look], offset);
  walk.log += start.log;
  return start.values;
}

/** One segment of some records side by side. */
function passTile(walks: readonly Walk[], { segment, i }: { segment: Segment; i: number }, kind: PassKind): void {
  const { days, steps, rate } = segment;
  const chain = kind.chain(rate);
  const starts = walks.map((walk) => weighLook(walk, segment, kind.offset));
  const at = Float64Array.from({ length: steps }, (_, k) => days - ((k + 0.5) * days) / steps);
  const blocks = blocksOf(chain, kind.isWhole ? 0 : 1);
  if (kind.isWhole) for (const { record } of walks) joinBlocks(blocks, record.used[i] ?? blocks);
  const results = valuePasses(chain, starts, {
    days,
    watch: kind.gates.map((gate) => ({ gate, at })),
    weightsOf: kind.kernel.weightsOf,
    blocks,
  });
  walks.forEach((walk, k) => {
    const { end, watched } = results[k] ?? { end: walk.value, watched: [] };
    walk.value = end;
    walk.parts.unshift({ log: walk.log, watched, end });
  });
}

/** Follows records back to the end of the first segment, side by side; each begins at its own last look. */
function pass(segments: readonly Segment[], records: readonly BackwardRecord[], kind: PassKind): Watched[][] {
  const walks = records.map((record): Walk => ({ record, value: kind.terminal, log: 0, parts: [] }));
  for (let i = segments.length - 1; i > 0; i--) {
    const segment = segments[i];
    const open = walks.filter(({ record }) => i < record.used.length);
    for (let from = 0; segment && from < open.length; from += TILE)
      passTile(open.slice(from, from + TILE), { segment, i }, kind);
  }
  const [first] = segments;
  return walks.map((walk) => {
    const end = first ? weighLook(walk, first, kind.offset) : walk.value;
    return [{ log: walk.log, watched: [], end }, ...walk.parts];
  });
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
  const none = new Float64Array(0);
  const joined = (r: number, i: number): BackwardPart => {
    const [all, brood] = [whole[r]?.[i], present[r]?.[i]];
    const logs = { firstLog: all?.log ?? 0, presentLog: brood?.log ?? 0 };
    const [segment] = segments;
    if (i === 0 && segment && all && brood)
      return { ...firstSegmentValues(kernel, segment, { whole: all.end, present: brood.end }), ...logs };
    const [presentEgg = none, presentCapped = none] = brood?.watched ?? [];
    return { firstEgg: all?.watched[0] ?? none, presentEgg, presentCapped, ...logs };
  };
  return records.map(({ used }, r) => used.map((_, i) => joined(r, i)));
}
