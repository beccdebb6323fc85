import { describe, expect, it } from 'vitest';
import type { AlphaMetric } from '@/lib/stats/coincidence-alpha';
import { confusionTable } from '@/lib/stats/confusion-table';
import { krippendorffAlpha } from '@/lib/stats/krippendorff-alpha';
import { tableAlpha } from '@/lib/stats/table-alpha';
import agreement from '@/tests/fixtures/stats/agreement.json';

const [FOUR_OBSERVERS, BINARY, LETTERS] = agreement.krippendorff;

/** Two observers' rows as units; letters become numbers in the order of the alphabet. */
function unitsOf(observers: readonly (readonly (string | number)[])[]): number[][] {
  const [first = [], second = []] = observers;
  const code = (value: string | number) => (typeof value === 'number' ? value : value.charCodeAt(0));
  return first.map((value, at) => [code(value), code(second[at] ?? '')]);
}

describe("Krippendorff's alpha", () => {
  it.each<[AlphaMetric, number, number]>([
    ['nominal', 0.743, 0.743421052632],
    ['ordinal', 0.815, 0.815387503814],
    ['interval', 0.849, 0.849107142857],
    ['ratio', 0.797, 0.79740277469],
  ])(
    'A07–A08 %s is %f for four observers with gaps (Krippendorff 2011; digits from irr, R 4.2.2)',
    (metric, printed, full) => {
      const value = krippendorffAlpha(FOUR_OBSERVERS?.units ?? [], metric) ?? NaN;
      expect(Math.abs(value - printed)).toBeLessThan(5e-4);
      expect(value).toBeCloseTo(full, 9);
    },
  );

  it('A09 is .095 for the binary and .692 for the nominal pair of observers (Krippendorff 2011)', () => {
    expect(krippendorffAlpha(unitsOf(BINARY?.observers ?? []), 'nominal')).toBeCloseTo(0.095238095238, 9);
    expect(krippendorffAlpha(unitsOf(LETTERS?.observers ?? []), 'nominal')).toBeCloseTo(0.691964285714, 9);
  });

  it('is undefined when no unit was judged twice or all judgements are one value', () => {
    expect(krippendorffAlpha([[1, null], [null, 2]], 'nominal')).toBeNull(); // prettier-ignore
    expect(krippendorffAlpha([[3, 3], [3, 3]], 'ordinal')).toBeNull(); // prettier-ignore
    expect(krippendorffAlpha([], 'nominal')).toBeNull();
  });

  it('leaves out units judged once', () => {
    const units = [[1, 1], [2, 2], [1, 2], [2, 2]]; // prettier-ignore
    expect(krippendorffAlpha([...units, [7, null]], 'ordinal')).toBe(krippendorffAlpha(units, 'ordinal'));
  });

  it.each<AlphaMetric>(['nominal', 'ordinal'])('%s is the same from a table as from the pairs behind it', (metric) => {
    const pairs = [[1, 1], [2, 2], [3, 2], [3, 3], [5, 4], [1, 3], [4, 4]] as const; // prettier-ignore
    const table = confusionTable<number>(pairs, [1, 2, 3, 4, 5]);
    expect(tableAlpha(table, metric)).toBeCloseTo(krippendorffAlpha(pairs, metric) ?? NaN, 12);
  });
});
