import 'server-only';
import { READING_SCALE } from '@/lib/comb/reading-scale';
import type { CellState } from '@/lib/comb/states';
import { groupBy } from '@/lib/kit/group-by';
import { type PooledAgreement, pooledAgreement } from '@/lib/stats/pooled-agreement';
import { pairedCells } from '@/lib/stats/paired-cells';
import type { ComparedPair } from './compared-visits';
import { idKey } from './id-key';
import type { NameOf } from './member-names';
import type { Comparison } from './reading-pairs';

/** One month of a trend. */
export interface TrendPoint extends PooledAgreement {
  /** `YYYY-MM`. */
  month: string;
  /** Combs it is made from. */
  combs: number;
}

/** How one person's readings agree with those they are compared with, month by month. */
export interface ReaderTrend {
  /** Opaque, the same for one person on one page. */
  key: string;
  reader: string;
  comparison: Comparison;
  points: TrendPoint[];
}

/** How far field and lab agree about one state, month by month. */
export interface StateTrend {
  state: CellState;
  points: TrendPoint[];
}

/** A comparison boiled down to its pairs of words. */
interface Compared {
  pair: ComparedPair;
  words: { first: CellState; second: CellState }[];
}

function compare(pair: ComparedPair): Compared {
  const { pairs } = pairedCells<CellState>(pair.firstCells, pair.secondCells, READING_SCALE.leftOut);
  return { pair, words: pairs };
}

/** Pools comparisons by month. `counted` says which cells count, `agreed` which of them agree. */
function byMonth(compared: readonly Compared[], counts: (words: Compared['words'][number]) => boolean): TrendPoint[] {
  const months = groupBy(compared, ({ pair }) => pair.month);
  return [...months]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .flatMap(([month, own]) => {
      const parts = own.map(({ words }) => {
        const counted = words.filter(counts);
        return { n: counted.length, agreed: counted.filter(({ first, second }) => first === second).length };
      });
      const pooled = pooledAgreement(parts);
      return pooled ? [{ month, combs: parts.filter(({ n }) => n > 0).length, ...pooled }] : [];
    });
}

/** The person a comparison tells about: who read at the nest, or who read again in the lab. */
function judged({ comparison, first, second }: ComparedPair): Buffer {
  return comparison === 'field-lab' ? first.opened_by : second.opened_by;
}

/** Trends of each reader. Two readers of one comb agree with each other: neither is taken for the truth. */
export function readerTrends(pairs: readonly ComparedPair[], nameOf: NameOf): ReaderTrend[] {
  const groups = groupBy(pairs.map(compare), ({ pair }) => `${idKey(judged(pair))} ${pair.comparison}`);
  const trends = [...groups].flatMap(([key, own]) => {
    const [first] = own;
    if (!first) return [];
    const points = byMonth(own, () => true);
    return points.length === 0
      ? []
      : [{ key, reader: nameOf(judged(first.pair)), comparison: first.pair.comparison, points }];
  });
  return trends.sort(
    (a, b) => a.reader.localeCompare(b.reader, 'en') || a.comparison.localeCompare(b.comparison, 'en'),
  );
}

/** Trends of each state between field and lab: of the cells that either called so, how many both did. */
export function stateTrends(pairs: readonly ComparedPair[]): StateTrend[] {
  const compared = pairs.filter(({ comparison }) => comparison === 'field-lab').map(compare);
  return READING_SCALE.categories.flatMap((state) => {
    const points = byMonth(compared, ({ first, second }) => first === state || second === state);
    return points.length === 0 ? [] : [{ state, points }];
  });
}
