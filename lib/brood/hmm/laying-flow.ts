import type { CellModel } from './cell-model';
import { type QuadraturePoint, quadrature } from './legendre';
import { type Gate, massPass, valuePass } from './power-pass';
import { type Station, normalised } from './stations';
import type { Uniformised } from './uniformised';

/** What one stretch between visits or changes of the clocks says. */
export interface Pass {
  /** The moments asked about that lie in it, its end included. */
  moments: readonly number[];
  /** For every state before the first egg: its mass and its value at the moments. */
  unlaidMass: Float64Array[];
  unlaidValue: Float64Array[];
  /** Logarithm of the factor that makes mass × value a probability. */
  scale: number;
}

/** A piece of the flow into the egg of the present brood. */
export interface TimedFlow {
  at: number;
  mass: number;
}

/** A stretch with everything a pass over it needs. */
interface Stretch {
  from: number;
  to: number;
  generator: Uniformised;
  brood: Uniformised;
  /** Flow into an egg per day. */
  laying: Gate;
  moments: readonly number[];
  points: readonly QuadraturePoint[];
  /** What was seen at its end. */
  seen: readonly Float64Array[];
}

/** Quadrature panels in ticks of the chain: the integrand is then smooth to far below 1e-8. */
const PANEL_TICKS = 1;

/** Cuts the time from the start to the last visit at visits and changes of the clocks. */
function stretchesOf(model: CellModel, visits: readonly Station[], moments: readonly number[]): Stretch[] {
  const times = [...new Set(visits.map(({ time }) => time))].filter((time) => time > model.start.time);
  return times.flatMap((to, i) => {
    const span = { from: times[i - 1] ?? model.start.time, to };
    const broods = model.brood.stretches(span);
    return model.chain.stretches(span).map((piece, k) => {
      const isFirst = piece.from === model.start.time;
      const inside = moments.filter((m) => (m > piece.from || (isFirst && m === piece.from)) && m <= piece.to);
      const edges = [piece.from, ...inside.filter((m) => m > piece.from && m < piece.to), piece.to];
      const longest = PANEL_TICKS / Math.max(piece.generator.clock, 1e-9);
      return {
        ...piece,
        brood: broods[k]?.generator ?? piece.generator,
        laying: model.layingGate(piece.speeds),
        moments: inside,
        points: edges.slice(1).flatMap((edge, j) => quadrature({ from: edges[j] ?? piece.from, to: edge }, longest)),
        seen:
          piece.to === to
            ? visits.filter(({ time }) => time === to).flatMap(({ likelihood }) => (likelihood ? [likelihood] : []))
            : [],
      };
    });
  });
}

function weigh(vector: Float64Array, seen: readonly Float64Array[], offset = 0): Float64Array {
  return seen.reduce((v, likelihood) => v.map((x, s) => x * (likelihood[s + offset] ?? 0)), vector);
}

const total = (vector: Float64Array) => vector.reduce((sum, x) => sum + x, 0);

/** The forward pass: masses before the first egg, the flow into eggs, and the logarithm of what was divided out. */
function forward({ start, unlaid }: CellModel, stretches: readonly Stretch[], atStart: readonly Float64Array[]) {
  let mass = weigh(start.mass, atStart);
  let log = Math.log(total(mass));
  mass = normalised(mass);
  const rows = stretches.map(({ from, to, generator, laying, moments, points, seen }) => {
    const before = log;
    const at = Float64Array.from(moments, (m) => m - from);
    const inflow = { gate: laying, at: Float64Array.from(points, (point) => point.at - from) };
    const watch = [...unlaid.map((state) => ({ gate: [[state, 1]] as const, at })), inflow];
    const { end, watched } = massPass(generator, mass, { days: to - from, watch });
    const seenMass = weigh(end, seen);
    log += Math.log(total(seenMass));
    mass = normalised(seenMass);
    return { log: before, unlaid: watched.slice(0, -1), laying: watched.at(-1) ?? at };
  });
  return { rows, log, last: mass };
}

/** A backward pass; what it watches is counted back from the end of each stretch. */
function backward(
  stretches: readonly Stretch[],
  terminal: Float64Array,
  pass: {
    chain: (stretch: Stretch) => Uniformised;
    offset: number;
    watch: (stretch: Stretch) => { gate: Gate; at: Float64Array }[];
  },
) {
  let value = terminal;
  let log = 0;
  return stretches
    .toReversed()
    .map((stretch) => {
      const seen = weigh(value, stretch.seen, pass.offset);
      log += Math.log(Math.max(total(seen), Number.MIN_VALUE));
      const days = stretch.to - stretch.from;
      const { end, watched } = valuePass(pass.chain(stretch), normalised(seen), { days, watch: pass.watch(stretch) });
      value = end;
      return { log, watched };
    })
    .reverse();
}

/**
 * Follows a record forward and backward, and reads off what the laws of laying are made of.
 *
 * @param moments in order, none before the start or after the last visit.
 */
export function layingFlow(model: CellModel, visits: readonly Station[], moments: readonly number[]) {
  const stretches = stretchesOf(model, visits, moments);
  const atStart = visits
    .filter(({ time }) => time === model.start.time)
    .flatMap(({ likelihood }) => (likelihood ? [likelihood] : []));
  const { rows, log, last } = forward(model, stretches, atStart);
  const occupied = model.states.keys.reduce((sum, _, s) => sum + (model.living[s] ?? 0) * (last[s] ?? 0), 0);
  const ones = new Float64Array(model.states.count).fill(1);
  const all = backward(stretches, ones, {
    chain: ({ generator }) => generator,
    offset: 0,
    watch: ({ to, moments: inside }) =>
      model.unlaid.map((state) => ({ gate: [[state, 1]], at: Float64Array.from(inside, (m) => to - m) })),
  });
  const ofBrood = backward(stretches, model.broodLiving, {
    chain: ({ brood }) => brood,
    offset: model.broodOffset,
    watch: ({ to, points }) => [{ gate: model.entryGate, at: Float64Array.from(points, ({ at }) => to - at) }],
  });
  const passes: Pass[] = stretches.map(({ moments: inside }, i) => ({
    moments: inside,
    unlaidMass: rows[i]?.unlaid ?? [],
    unlaidValue: all[i]?.watched ?? [],
    scale: (rows[i]?.log ?? 0) + (all[i]?.log ?? 0) - log,
  }));
  const flows: TimedFlow[] = stretches.flatMap(({ points }, i) => {
    const scale = Math.exp((rows[i]?.log ?? 0) + (ofBrood[i]?.log ?? 0) - log) / occupied;
    return points.map(({ at, weight }, j) => ({
      at,
      mass: scale * weight * (rows[i]?.laying[j] ?? 0) * (ofBrood[i]?.watched[0]?.[j] ?? 0),
    }));
  });
  const still = model.unlaid.map((state) => Float64Array.of(last[state] ?? 0));
  const alone: Pass = { moments, unlaidMass: still, unlaidValue: still.map(() => Float64Array.of(1)), scale: 0 };
  return { passes: stretches.length > 0 ? passes : [alone], flows, occupied: occupied > 0 };
}
