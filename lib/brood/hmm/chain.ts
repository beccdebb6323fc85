import type { SpeedPiece, Transitions } from './transitions';
import { massPass, valuePass } from './power-pass';
import { type Uniformised, uniformise } from './uniformised';

/** A chain in time: it carries masses forward and values backward between any two days. */
export interface Chain {
  states: number;
  forward(mass: Float64Array, span: Span): Float64Array;
  backward(value: Float64Array, span: Span): Float64Array;
  /** The span cut where the clocks change speed, each stretch with its generator. */
  stretches(span: Span): { from: number; to: number; generator: Uniformised; speeds: readonly number[] }[];
}

/** From one day to a later one; fractions of a day are days like any other. */
export interface Span {
  from: number;
  to: number;
}

/** A stretch of time with constant speeds. */
interface Stretch extends Span {
  piece: number;
}

/** Neighbouring pieces with equal speeds as one. */
function merged(pieces: readonly SpeedPiece[]): SpeedPiece[] {
  const sorted = [...pieces].sort((a, b) => a.from - b.from);
  return sorted.filter(
    ({ speeds }, i) => i === 0 || speeds.some((speed, clock) => speed !== sorted[i - 1]?.speeds[clock]),
  );
}

/** Cuts a span where the speeds change. Before the first piece its speeds hold already. */
function stretches(pieces: readonly SpeedPiece[], { from, to }: Span): Stretch[] {
  return pieces
    .map((piece, i) => {
      const start = i === 0 ? from : Math.max(from, piece.from);
      const end = Math.min(to, pieces[i + 1]?.from ?? Infinity);
      return { piece: i, from: start, to: end };
    })
    .filter((stretch) => stretch.to > stretch.from);
}

/**
 * A chain whose clocks change speed in steps; exact for such clocks.
 *
 * @param pieces at least one; the last holds for ever.
 */
export function chainOf(moves: Transitions, pieces: readonly SpeedPiece[]): Chain {
  const steps = merged(pieces);
  const made = new Map<number, Uniformised>();
  const at = (piece: number): Uniformised => {
    const known = made.get(piece) ?? uniformise(moves, steps[piece]?.speeds ?? []);
    made.set(piece, known);
    return known;
  };
  return {
    states: moves.states,
    forward: (mass, span) =>
      stretches(steps, span).reduce((v, { piece, from, to }) => massPass(at(piece), v, { days: to - from }).end, mass),
    backward: (value, span) =>
      stretches(steps, span).reduceRight(
        (v, { piece, from, to }) => valuePass(at(piece), v, { days: to - from }).end,
        value,
      ),
    stretches: (span) =>
      stretches(steps, span).map(({ piece, from, to }) => ({
        from,
        to,
        generator: at(piece),
        speeds: steps[piece]?.speeds ?? [],
      })),
  };
}
