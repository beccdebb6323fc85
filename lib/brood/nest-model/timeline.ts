/** A stretch of the nest's time in which the development clock runs evenly. */
export interface Segment {
  /** Days since the first look. */
  from: number;
  days: number;
  /** Days of development per calendar day. */
  rate: number;
  /** Equal steps it is cut into; events are dated to the step. */
  steps: number;
  /** Number of the look at its end, or null. */
  look: number | null;
}

/** The time in which everything seen was laid, in days since the first look. */
export interface Timeline {
  looks: readonly number[];
  segments: readonly Segment[];
  /** Ends of all steps of all segments, the start first. */
  edges: Float64Array;
}

/** Mean rate of the development clock between two days. */
export type RateBetween = (from: number, to: number) => number;

const STEP = 0.25;
/** Very long gaps get longer steps rather than more of them. */
const MOST_STEPS = 800;

function stepsOf(days: number): number {
  return Math.max(1, Math.min(MOST_STEPS, Math.ceil(days / STEP - 1e-9)));
}

/** Cuts a span into equal pieces of at most a day, and joins neighbours whose clock runs alike. */
export function evenPieces(
  span: { from: number; to: number },
  rateBetween: RateBetween,
): { from: number; to: number; rate: number }[] {
  const count = Math.max(1, Math.ceil(span.to - span.from - 1e-9));
  const at = (i: number) => span.from + ((span.to - span.from) * i) / count;
  const pieces: { from: number; to: number; rate: number }[] = [];
  for (let i = 0; i < count; i++) {
    const [from, to] = [at(i), i + 1 === count ? span.to : at(i + 1)];
    const rate = rateBetween(from, to);
    const last = pieces.at(-1);
    if (last && Math.abs(last.rate - rate) < 1e-12) last.to = to;
    else pieces.push({ from, to, rate });
  }
  return pieces;
}

/**
 * Lays out the time from `priorDays` before the first look to the last one.
 *
 * @param looks days since the first look, rising, the first 0.
 */
export function timelineOf(looks: readonly number[], priorDays: number, rateBetween: RateBetween): Timeline {
  const segments = looks.flatMap((to, look) =>
    evenPieces({ from: looks[look - 1] ?? -priorDays, to }, rateBetween).map((piece) => {
      const days = piece.to - piece.from;
      return {
        from: piece.from,
        days,
        rate: piece.rate,
        steps: stepsOf(days),
        look: piece.to === to ? look : null,
      };
    }),
  );
  const ends = segments.flatMap(({ from, days, steps }) =>
    Array.from({ length: steps }, (_, i) => from + (days * (i + 1)) / steps),
  );
  return { looks, segments, edges: Float64Array.from([-priorDays, ...ends]) };
}
