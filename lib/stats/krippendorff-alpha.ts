import { type AlphaMetric, coincidenceAlpha } from './coincidence-alpha';
import { coincidences, type Unit } from './coincidences';

/**
 * Krippendorff's alpha: 1 minus observed over expected disagreement. It takes any number of readers, and units that
 * some of them left out.
 *
 * Source: Krippendorff 2011, Computing Krippendorff's Alpha-Reliability.
 *
 * @param units one row a thing judged; its length may differ from row to row.
 * @param metric `nominal` for unordered words, `ordinal` for ordered ones; numbers give the order.
 * @returns null where it is undefined: nothing was judged twice, or all judgements are one value.
 */
export function krippendorffAlpha(units: readonly Unit[], metric: AlphaMetric): number | null {
  return coincidenceAlpha(coincidences(units), metric);
}
