import { type Gate, valuePass } from '@/lib/brood/hmm/power-pass';
import type { Blocks, Uniformised } from '@/lib/brood/hmm/uniformised';
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

/** A record as seen from its last look. */
interface Record {
  /** The segments up to the last look. */
  segments: readonly Segment[];
  seen: readonly (Float64Array | null)[];
  /** For each segment the blocks of states that masses ever were in. */
  used: readonly Blocks[];
}

/** Values divided by the largest, and the logarithm of that. */
function scaled(values: Float64Array): { values: Float64Array; log: number } {
  const most = values.reduce((a, b) => Math.max(a, b), 0);
  return most > 0 ? { values: values.map((v) => v / most), log: Math.log(most) } : { values, log: 0 };
}

function weighed(values: Float64Array, likelihood: Float64Array | null | undefined, offset: number): Float64Array {
  return likelihood ? values.map((v, s) => v * (likelihood[s + offset] ?? 0)) : values;
}

/** One kind of backward pass over all segments, last first. */
function pass(
  record: Record,
  terminal: Float64Array,
  kind: {
    chain: (rate: number) => Uniformised;
    gates: readonly Gate[];
    offset: number;
    blocks?: readonly Blocks[];
    kernel: NestKernel;
  },
): { log: number; watched: Float64Array[] }[] {
  let value = terminal;
  let log = 0;
  const parts = record.segments.map((segment, i) => ({ segment, i })).reverse();
  return parts
    .map(({ segment, i }) => {
      const seen = segment.look === null ? null : record.seen[segment.look];
      const start = scaled(weighed(value, seen, kind.offset));
      log += start.log;
      const { days, steps, rate } = segment;
      const at = Float64Array.from({ length: steps }, (_, k) => days - ((k + 0.5) * days) / steps);
      const { end, watched } = valuePass(kind.chain(rate), start.values, {
        days,
        watch: kind.gates.map((gate) => ({ gate, at })),
        weightsOf: kind.kernel.weightsOf,
        blocks: kind.blocks?.[i],
        isEndNeeded: i > 0,
      });
      value = end;
      return { log, watched };
    })
    .reverse();
}

/** Follows a record backward: for the cell as a whole, and for the one brood that is alive at the end. */
export function backwardCell(kernel: NestKernel, record: Record): BackwardPart[] {
  const { model } = kernel;
  const whole = pass(record, new Float64Array(model.states.count).fill(1), {
    kernel,
    chain: kernel.full,
    gates: [[[model.eggState, 1]]],
    offset: 0,
    blocks: record.used,
  });
  const present = pass(record, model.broodLiving, {
    kernel,
    chain: kernel.brood,
    gates: [[[0, 1]], [[model.pupaPhase, 1]]],
    offset: model.eggState,
  });
  return record.segments.map((_, i) => ({
    firstEgg: whole[i]?.watched[0] ?? new Float64Array(0),
    firstLog: whole[i]?.log ?? 0,
    presentEgg: present[i]?.watched[0] ?? new Float64Array(0),
    presentCapped: present[i]?.watched[1] ?? new Float64Array(0),
    presentLog: present[i]?.log ?? 0,
  }));
}
