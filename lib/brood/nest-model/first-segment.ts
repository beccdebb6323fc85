import { BLOCK } from '@/lib/brood/hmm/uniformised';
import { poissonMeans } from '@/lib/brood/poisson';
import type { NestKernel } from './nest-kernel';
import type { Segment } from './timeline';

/** Values at the end of the first segment: of the whole cell, and of the brood that is alive at the last look. */
interface EndValues {
  whole: Float64Array;
  present: Float64Array;
}

/** The same values as seen from each step of the segment. */
interface StepValues {
  firstEgg: Float64Array;
  presentEgg: Float64Array;
  presentCapped: Float64Array;
}

/** Values below this share of the largest count as none. */
const NOTHING = 1e-16;

/** Σ row · value over the states from `from` on; `value` begins at `from − offset`. */
function dot(
  row: Float64Array,
  value: Float64Array,
  { from, to, offset }: { from: number; to: number; offset: number },
): number {
  let sum = 0;
  for (let s = from; s < to; s++) sum += (row[s] ?? 0) * (value[s - offset] ?? 0);
  return sum;
}

/** Values of an egg after each number of ticks, in the states that its row is in. */
function eggValues(kernel: NestKernel, { rate, ticks }: { rate: number; ticks: number }, values: EndValues) {
  const { rows, blocks, chain } = kernel.eggRows(rate, ticks);
  const { eggState, broodSize } = kernel.model;
  const whole = new Float64Array(ticks);
  const present = new Float64Array(ticks);
  const broodEnd = eggState + broodSize;
  for (let n = 0; n < ticks; n++) {
    const [row, held] = [rows[n], blocks[n]];
    if (!row || !held) continue;
    for (let b = 0; b < held.length; b++) {
      if (held[b] === 0) continue;
      const [from, to] = [b * BLOCK, Math.min(chain.states, (b + 1) * BLOCK)];
      whole[n] = (whole[n] ?? 0) + dot(row, values.whole, { from, to, offset: 0 });
      const brood = { from: Math.max(from, eggState), to: Math.min(to, broodEnd), offset: eggState };
      if (brood.from < brood.to) present[n] = (present[n] ?? 0) + dot(row, values.present, brood);
    }
  }
  return { whole, present };
}

/** A sequence up to where it falls to nothing for good. */
function upToNothing(sequence: Float64Array): Float64Array {
  let [end, most] = [sequence.length, 0];
  for (let n = 0; n < end; n++) most = Math.max(most, sequence[n] ?? 0);
  while (end > 0 && (sequence[end - 1] ?? 0) <= most * NOTHING) end--;
  return end === sequence.length ? sequence : Float64Array.from([...sequence.subarray(0, end), 0]);
}

/**
 * Carries values back through the first segment, where nothing was seen and only the flows into eggs and caps count:
 * every egg has the same rows of masses, so they are weighed with the values instead of following each record.
 */
export function firstSegmentValues(kernel: NestKernel, { days, steps, rate }: Segment, values: EndValues): StepValues {
  const { clock } = kernel.full(rate);
  const longest = kernel.weightsOf((clock * days * (steps - 0.5)) / steps);
  const ticks = longest.first + longest.weights.length;
  const { whole, present } = eggValues(kernel, { rate, ticks }, values);
  const cap = kernel.capRows(rate);
  const capped = new Float64Array(cap.rows.length + 1);
  cap.rows.forEach((row, n) => {
    capped[n] = dot(row, values.present, { from: kernel.model.pupaPhase, to: kernel.model.broodSize, offset: 0 });
  });
  const at = (ticksPerDay: number) =>
    Array.from({ length: steps }, (_, k) => kernel.weightsOf((ticksPerDay * days * (steps - k - 0.5)) / steps));
  const laws = at(clock);
  return {
    firstEgg: poissonMeans(whole, laws),
    presentEgg: poissonMeans(upToNothing(present), laws),
    presentCapped: poissonMeans(upToNothing(capped), cap.chain.clock === clock ? laws : at(cap.chain.clock)),
  };
}
