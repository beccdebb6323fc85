import type { BroodSpan, LivingStage } from './brood-spans';

/** Mean and individual variation of the stages that serve a nest. */
export interface StageExpectation {
  /** Days at the reference temperature. */
  mean: Readonly<Record<LivingStage, number>>;
  /** Coefficient of variation of each whole stage. */
  cv: Readonly<Record<LivingStage, number>>;
}

/** The whole stages that were seen in one nest. */
export interface NestSpans {
  spans: readonly BroodSpan[];
}

/** What goes into the update beside the nests. */
export interface DurationPrior {
  expectation: StageExpectation;
  /** Standard deviation of the log factor before any nest. */
  sd: number;
  /** Standard deviation of the log factor between nests of one taxon. */
  betweenNests: number;
}

/** A factor on all durations of a taxon: likeliest and 95 times in 100. */
export interface FactorRange {
  median: number;
  p95: [number, number];
}

/** The factor before and after, and what it rests on. */
export interface LearnedFactor {
  prior: FactorRange;
  posterior: FactorRange;
  /** The log of the rate from nest to nest, as settings hold it: minus the log factor; spread and ignorance together. */
  logRate: { mean: number; sd: number };
  nests: number;
  broods: number;
}

/** A normal law of the log factor. */
interface LogLaw {
  mean: number;
  variance: number;
}

const Z95 = 1.959963984540054;
/** A span whose ends are known no better than this share of it says more about the visits than about the brood. */
const MOST_WIDTH = 0.5;

function rangeOf({ mean, variance }: LogLaw): FactorRange {
  const half = Z95 * Math.sqrt(variance);
  return { median: Math.exp(mean), p95: [Math.exp(mean - half), Math.exp(mean + half)] };
}

function expectedDays({ stages }: BroodSpan, { mean }: StageExpectation): number {
  return stages.reduce((sum, stage) => sum + mean[stage], 0);
}

/** The log ratio of one brood's time to the expected one; variance from the visits' spacing and from individuals. */
function broodLaw(span: BroodSpan, expectation: StageExpectation): LogLaw {
  const expected = expectedDays(span, expectation);
  const visits = (span.widths[0] ** 2 + span.widths[1] ** 2) / 12;
  const individuals = span.stages.reduce(
    (sum, stage) => sum + (expectation.cv[stage] * expectation.mean[stage]) ** 2,
    0,
  );
  return { mean: Math.log(span.days / expected), variance: (visits + individuals) / expected ** 2 };
}

/** Combines independent normal laws of one number. */
function combine(laws: readonly LogLaw[]): LogLaw {
  const precision = laws.reduce((sum, { variance }) => sum + 1 / variance, 0);
  return {
    mean: laws.reduce((sum, { mean, variance }) => sum + mean / variance, 0) / precision,
    variance: 1 / precision,
  };
}

function isUsable(span: BroodSpan, expectation: StageExpectation): boolean {
  return span.days > 0 && Math.max(...span.widths) <= MOST_WIDTH * expectedDays(span, expectation);
}

/**
 * The factor that a taxon's durations should be multiplied by, from whole stages seen in the team's own nests.
 *
 * A normal model of the log factor with known variances, in closed form: the broods of a nest are combined by their
 * precision, the spread between nests is added, and nests are combined with the prior N(0, sd²). With m_j and v_j
 * for nest j: precision 1/sd² + Σ 1/v_j, mean Σ (m_j/v_j) over the precision.
 *
 * @returns null when no brood was followed through a whole stage.
 */
export function learnDurations(
  nests: readonly NestSpans[],
  { expectation, sd, betweenNests }: DurationPrior,
): LearnedFactor | null {
  const usable = nests.map(({ spans }) => spans.filter((span) => isUsable(span, expectation)));
  const seen = usable.filter((spans) => spans.length > 0);
  if (seen.length === 0) return null;
  const laws = seen.map((spans) => {
    const { mean, variance } = combine(spans.map((span) => broodLaw(span, expectation)));
    return { mean, variance: variance + betweenNests ** 2 };
  });
  const prior: LogLaw = { mean: 0, variance: sd ** 2 };
  const posterior = combine([prior, ...laws]);
  return {
    prior: rangeOf(prior),
    posterior: rangeOf(posterior),
    logRate: { mean: -posterior.mean, sd: Math.sqrt(posterior.variance + betweenNests ** 2) },
    nests: seen.length,
    broods: seen.reduce((sum, spans) => sum + spans.length, 0),
  };
}
