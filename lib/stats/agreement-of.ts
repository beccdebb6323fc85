import { seededRandom } from '@/lib/kit/random';
import { type AgreementFigure, type AgreementStatistic, agreementFigure } from './agreement-figure';
import { agreementWeights, type Weighting } from './agreement-weights';
import { type ClassAgreement, classAgreement } from './class-agreement';
import type { AlphaMetric } from './coincidence-alpha';
import { type ConfusionTable, confusionTable } from './confusion-table';
import type { Interval } from './interval';
import { type CellPair, type JudgedCell, type LeftOutCells, pairedCells } from './paired-cells';
import { type RawAgreement, rawAgreement } from './raw-agreement';
import { kappaValue } from './kappa-value';
import { tableAlpha } from './table-alpha';
import { weightedKappa } from './weighted-kappa';
import { wilsonInterval } from './wilson-interval';

/** The words two readings are compared on. */
export interface ReadingScale<S extends string> {
  /** Every word that counts as a judgement. */
  categories: readonly S[];
  /** Those that have an order, lowest first. */
  ordered: readonly S[];
  /** The word for "not judged". */
  leftOut: S;
  /** How often the cells are drawn again for an interval; 1,000 unless said. 0 leaves those intervals out: a listing
   * of thousands of pairs must not take minutes. */
  draws?: number;
}

/** How far two readings of one comb agree; every figure with its own n. */
export interface ReadingAgreement<S extends string> {
  /** Cells both have judged. */
  n: number;
  leftOut: LeftOutCells;
  /** Equal words over n, with Wilson's interval. */
  raw: RawAgreement & { interval: Interval };
  kappa: AgreementFigure;
  /** Kappa over the ordered stages only, near misses counted in part. */
  kappaLinear: AgreementFigure;
  kappaQuadratic: AgreementFigure;
  /** Krippendorff's alpha over all words. */
  alphaNominal: AgreementFigure;
  /** Krippendorff's alpha over the ordered stages. */
  alphaOrdinal: AgreementFigure;
  /** Rows: the first reading's words; columns: the second's; in the order of `categories`. */
  table: { categories: readonly S[]; counts: number[][] };
  /** Agreement about each word, in the order of `categories`. */
  classes: ClassAgreement[];
  /** The cells they differ on, in the order of the first reading. */
  differences: CellPair<S>[];
}

/** Equal readings always give equal intervals: the draws are the same every time. */
const DRAWS_SEED = 20261201;
const DRAWS = 1000;

/** Every figure draws from the start of the same sequence, so none depends on which others were asked for. */
function figure(table: ConfusionTable, statistic: AgreementStatistic, draws = DRAWS): AgreementFigure {
  return agreementFigure(table, statistic, { random: seededRandom(DRAWS_SEED), draws });
}

function alpha(table: ConfusionTable, metric: AlphaMetric, draws?: number): AgreementFigure {
  return figure(table, { value: (drawn) => tableAlpha(drawn, metric) }, draws);
}

function kappa(table: ConfusionTable, weighting: Weighting, draws?: number): AgreementFigure {
  const weights = agreementWeights(table.length, weighting);
  const statistic = {
    value: (drawn: ConfusionTable) => kappaValue(drawn, weights)?.value ?? null,
    variance: (all: ConfusionTable) => weightedKappa(all, weights)?.variance ?? null,
  };
  return figure(table, statistic, draws);
}

/**
 * Compares two readings of one comb, cell by cell.
 *
 * @param first the reading that gives the rows: in the lab the one from the field.
 * @param second the blind one.
 * @param scale the words; `READING_SCALE` of `lib/comb` for combs.
 * @returns the figures. Cells that either left unread, or that only one has, are left out and counted; a figure that
 *   is undefined has no value and says why.
 */
export function agreementOf<S extends string>(
  first: readonly JudgedCell<S>[],
  second: readonly JudgedCell<S>[],
  scale: ReadingScale<S>,
): ReadingAgreement<S> {
  const { pairs, leftOut } = pairedCells(first, second, scale.leftOut);
  const words = pairs.map((pair): readonly [S, S] => [pair.first, pair.second]);
  const staged = words.filter((pair) => pair.every((word) => scale.ordered.includes(word)));
  const stages = confusionTable(staged, scale.ordered);
  const counts = confusionTable(words, scale.categories);
  const raw = rawAgreement(counts);
  const { draws } = scale;
  const used = confusionTable(words, [...new Set(words.flat())]);
  return {
    n: pairs.length,
    leftOut,
    raw: { ...raw, interval: wilsonInterval(raw.agreed, raw.n) },
    kappa: kappa(used, 'none', draws),
    kappaLinear: kappa(stages, 'linear', draws),
    kappaQuadratic: kappa(stages, 'quadratic', draws),
    alphaNominal: alpha(used, 'nominal', draws),
    alphaOrdinal: alpha(stages, 'ordinal', draws),
    table: { categories: scale.categories, counts },
    classes: classAgreement(counts),
    differences: pairs.filter((pair) => pair.first !== pair.second),
  };
}
