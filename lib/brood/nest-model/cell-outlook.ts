import { massPass } from '@/lib/brood/hmm/power-pass';
import { poissonMean } from '@/lib/brood/poisson';
import { blocksOf, tickMass } from '@/lib/brood/hmm/uniformised';
import type { LossByStage } from '@/lib/brood/losses';
import type { BroodModel } from './brood-model';
import type { NestKernel } from './nest-kernel';
import { type RateBetween, evenPieces } from './timeline';

/** The time after a last look. */
export interface Future {
  /** Days after the look, rising, the first 0. */
  times: Float64Array;
  /** Stretches until the clock runs evenly for good; the last one has no end. */
  pieces: readonly { days: number; rate: number; times: Float64Array }[];
}

/** What becomes of the brood that is alive at the last look. */
export interface Outlook {
  /** P(a brood is alive in the cell at the last look). */
  alive: number;
  /** The rest is given that. P(capped by then, lost later or not) and P(an adult has come out), at the future's times. */
  capped: Float64Array;
  out: Float64Array;
  losses: LossByStage;
  /** P(capped already at the last look). */
  cappedAlready: number;
}

const FINE_STEP = 0.25;
const FINE_DAYS = 75;
const FINISHED = 1e-9;
const MOST_TICKS = 20_000;

/**
 * Lays out the time after a look: quarter days first, whole days later.
 *
 * @param clockEnd day after which the development clock runs evenly, counted like `from`.
 */
export function futureOf(
  { from, clockEnd, horizon }: { from: number; clockEnd: number; horizon: number },
  rateBetween: RateBetween,
): Future {
  const finite =
    clockEnd > from
      ? evenPieces({ from, to: clockEnd }, rateBetween).map((piece) => ({
          ...piece,
          from: piece.from - from,
          to: piece.to - from,
        }))
      : [];
  const start = Math.max(0, clockEnd - from);
  const fine = Array.from({ length: Math.ceil(FINE_DAYS / FINE_STEP) }, (_, k) => start + (k + 1) * FINE_STEP);
  const coarse = Array.from(
    { length: Math.max(0, Math.ceil(horizon - FINE_DAYS)) },
    (_, k) => start + FINE_DAYS + k + 1,
  );
  const pieces = finite.map((piece) => {
    const steps = Math.max(1, Math.ceil((piece.to - piece.from) / FINE_STEP - 1e-9));
    const days = piece.to - piece.from;
    return { days, rate: piece.rate, times: Float64Array.from({ length: steps }, (_, k) => (days * (k + 1)) / steps) };
  });
  const endless = {
    days: Infinity,
    rate: rateBetween(clockEnd + 1, clockEnd + 2),
    times: Float64Array.from([...fine, ...coarse], (time) => time - start),
  };
  const starts = pieces.reduce<number[]>((all, { days }) => [...all, (all.at(-1) ?? 0) + days], [0]);
  const all = [...pieces, endless];
  return {
    times: Float64Array.from([0, ...all.flatMap(({ times }, i) => [...times].map((t) => t + (starts[i] ?? 0)))]),
    pieces: all,
  };
}

/** The present brood: generations added up, living brood only. */
function presentBrood({ states, eggState, broodSize, broodLiving }: BroodModel, mass: Float64Array): Float64Array {
  return broodLiving.map((isLiving, s) => {
    let sum = 0;
    for (let g = 0; g < states.generations; g++) sum += mass[eggState + g * broodSize + s] ?? 0;
    return isLiving * sum;
  });
}

const total = (mass: Float64Array) => mass.reduce((sum, p) => sum + p, 0);

/** Where the four ends of one brood are, and what counts as capped. */
function gatesOf({ broodSize, pupaPhase }: BroodModel) {
  const [out, egg, larva, lostCapped] = [broodSize - 4, broodSize - 3, broodSize - 2, broodSize - 1];
  const capped = Array.from({ length: broodSize - pupaPhase }, (_, i) => pupaPhase + i).filter(
    (s) => s !== egg && s !== larva,
  );
  return { out, egg, larva, lostCapped, capped: capped.map((s) => [s, 1] as const) };
}

/** Follows a brood with an even clock until nothing of it is left alive. */
function toTheEnd(kernel: NestKernel, mass: Float64Array, { rate, times }: Future['pieces'][number]) {
  const chain = kernel.brood(rate);
  const gates = gatesOf(kernel.model);
  const blocks = blocksOf(chain, 1);
  const [out, capped]: [number[], number[]] = [[], []];
  let [current, next] = [mass.slice(), new Float64Array(mass.length)];
  for (let n = 0; n < MOST_TICKS; n++) {
    if (n > 0) {
      tickMass(chain, { current, next }, blocks);
      [current, next] = [next, current];
    }
    let living = 0;
    for (let s = 0; s < gates.out; s++) living += current[s] ?? 0;
    let cappedNow = (current[gates.out] ?? 0) + (current[gates.lostCapped] ?? 0);
    for (let s = kernel.model.pupaPhase; s < gates.out; s++) cappedNow += current[s] ?? 0;
    out.push(current[gates.out] ?? 0);
    capped.push(cappedNow);
    if (living < FINISHED || chain.clock === 0) break;
  }
  const read = (sequence: readonly number[]) => {
    const values = Float64Array.from(sequence);
    return times.map((time) => poissonMean(values, kernel.weightsOf(chain.clock * time)));
  };
  return { end: current, out: read(out), capped: read(capped) };
}

/**
 * Follows the brood in the cell from the last look on; nothing is laid any more.
 *
 * @param last state masses at the last look, summing to 1 with the cell not being built.
 */
export function outlookOf(kernel: NestKernel, last: Float64Array, { pieces, times }: Future): Outlook | null {
  const present = presentBrood(kernel.model, last);
  const alive = total(present);
  if (!(alive > 0)) return null;
  let mass: Float64Array = present.map((p) => p / alive);
  const gates = gatesOf(kernel.model);
  const cappedAlready = gates.capped.reduce((sum, [s]) => sum + (mass[s] ?? 0), 0);
  const capped = [cappedAlready];
  const out = [0];
  for (const piece of pieces) {
    if (piece.days === Infinity) {
      const rest = toTheEnd(kernel, mass, piece);
      capped.push(...rest.capped);
      out.push(...rest.out);
      mass = rest.end;
      continue;
    }
    const { end, watched } = massPass(kernel.brood(piece.rate), mass, {
      days: piece.days,
      weightsOf: kernel.weightsOf,
      watch: [gates.capped, [[gates.out, 1]] as const].map((gate) => ({ gate, at: piece.times })),
    });
    capped.push(...(watched[0] ?? []));
    out.push(...(watched[1] ?? []));
    mass = end;
  }
  const losses = { egg: mass[gates.egg] ?? 0, larva: mass[gates.larva] ?? 0, capped: mass[gates.lostCapped] ?? 0 };
  const made = { alive, losses, cappedAlready, capped: Float64Array.from(capped), out: Float64Array.from(out) };
  return times.length === capped.length ? made : null;
}
