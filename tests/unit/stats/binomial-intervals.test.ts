import { describe, expect, it } from 'vitest';
import { exactInterval } from '@/lib/stats/exact-interval';
import { wilsonInterval } from '@/lib/stats/wilson-interval';
import binomial from '@/tests/fixtures/stats/binomial-ci.json';

type Limits = readonly number[];

function expectLimits({ low, high }: { low: number; high: number }, limits: Limits, tolerance: number): void {
  expect(Math.abs(low - (limits[0] ?? NaN))).toBeLessThanOrEqual(tolerance);
  expect(Math.abs(high - (limits[1] ?? NaN))).toBeLessThanOrEqual(tolerance);
}

describe('intervals of a share', () => {
  it.each(binomial.rows)('of $x in $n agree with scipy 1.17.1 and R 4.2.2 to ten digits', (row) => {
    const { computed } = binomial.tolerance;
    expectLimits(wilsonInterval(row.x, row.n), row.wilson, computed);
    expectLimits(exactInterval(row.x, row.n), row.clopper_pearson, computed);
    expectLimits(exactInterval(row.x, row.n, 'mid-p'), row.mid_p, computed);
  });

  const printed = binomial.rows.flatMap(({ x, n, published_4dp }) => (published_4dp ? [{ x, n, published_4dp }] : []));

  it.each(printed)('P01–P04: $x in $n as printed in Newcombe 1998, Statistics in Medicine 17, Table I', (row) => {
    const { published } = binomial.tolerance;
    expectLimits(wilsonInterval(row.x, row.n), row.published_4dp.wilson, published);
    expectLimits(exactInterval(row.x, row.n), row.published_4dp.clopper_pearson, published);
    expectLimits(exactInterval(row.x, row.n, 'mid-p'), row.published_4dp.mid_p, published);
  });

  it('P05: 10 in 10 is at least .722467200137 by Wilson, .691502892181 exactly (prop.test, binom.test, R 4.2.2)', () => {
    expect(wilsonInterval(10, 10).low).toBeCloseTo(0.722467200137, 10);
    expect(exactInterval(10, 10).low).toBeCloseTo(0.691502892181, 10);
  });

  it('say nothing when nothing was counted', () => {
    expect(wilsonInterval(0, 0)).toEqual({ low: 0, high: 1 });
    expect(exactInterval(0, 0)).toEqual({ low: 0, high: 1 });
  });
});
