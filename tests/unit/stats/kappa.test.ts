import { describe, expect, it } from 'vitest';
import { agreementWeights } from '@/lib/stats/agreement-weights';
import { cohenKappa } from '@/lib/stats/cohen-kappa';
import { weightedKappa } from '@/lib/stats/weighted-kappa';
import agreement from '@/tests/fixtures/stats/agreement.json';

const [COHEN_1968, COHEN_ASYMMETRIC, FLEISS_OWN] = agreement.own_weights;

/** Cohen 1968 gives weights of disagreement up to 6; ours are of agreement. */
function fromDisagreement(weights: number[][]): number[][] {
  return weights.map((row) => row.map((weight) => 1 - weight / 6));
}

describe('kappa', () => {
  it.each(agreement.rows)('and its standard error agree with $name ($source, $provenance)', (row) => {
    const size = row.table.length;
    const linear = weightedKappa(row.table, agreementWeights(size, 'linear'));
    const quadratic = weightedKappa(row.table, agreementWeights(size, 'quadratic'));
    const plain = cohenKappa(row.table);
    expect(plain?.value).toBeCloseTo(row.kappa, 9);
    expect(Math.sqrt(plain?.variance ?? NaN)).toBeCloseTo(row.se_kappa, 9);
    expect(linear?.value).toBeCloseTo(row.kappa_linear, 9);
    expect(Math.sqrt(linear?.variance ?? NaN)).toBeCloseTo(row.se_linear, 9);
    expect(quadratic?.value).toBeCloseTo(row.kappa_quadratic, 9);
    expect(Math.sqrt(quadratic?.variance ?? NaN)).toBeCloseTo(row.se_quadratic, 9);
  });

  it('A01 is .492 plain, .348 and .353 with own weights (Cohen 1968, Psychological Bulletin 70:213–220)', () => {
    const table = COHEN_1968?.table ?? [];
    const symmetric = fromDisagreement([[0, 1, 3], [1, 0, 6], [3, 6, 0]]); // prettier-ignore
    const asymmetric = fromDisagreement([[0, 1, 4], [1, 0, 6], [2, 2, 0]]); // prettier-ignore
    expect(Math.abs((cohenKappa(table)?.value ?? NaN) - 0.492)).toBeLessThan(5e-4);
    expect(weightedKappa(table, symmetric)?.value).toBeCloseTo(COHEN_1968?.kappa_w ?? NaN, 9);
    expect(weightedKappa(table, asymmetric)?.value).toBeCloseTo(COHEN_ASYMMETRIC?.kappa_w ?? NaN, 9);
  });

  it('A02 and A03 have the variances of Fleiss, Cohen & Everitt 1969 (Psychological Bulletin 72:323–327)', () => {
    const table = FLEISS_OWN?.table ?? [];
    const weights = [[1, 0, 4 / 9], [0, 1, 6 / 9], [4 / 9, 6 / 9, 1]]; // prettier-ignore
    const plain = cohenKappa(table);
    const weighted = weightedKappa(table, weights);
    expect(plain?.value).toBeCloseTo(0.428571428571, 9);
    expect(plain?.variance).toBeCloseTo(0.00288487204406, 9);
    expect(plain?.varianceAtZero).toBeCloseTo(0.00308163265306, 9);
    expect(weighted?.value).toBeCloseTo(0.507060333761, 9);
    expect(weighted?.variance).toBeCloseTo(0.00324833315155, 9);
    expect(weighted?.varianceAtZero).toBeCloseTo(0.0042687540888, 9);
  });

  it('is undefined when nothing was compared or both used one word throughout', () => {
    expect(cohenKappa([[0, 0], [0, 0]])).toBeNull(); // prettier-ignore
    expect(cohenKappa([[12, 0], [0, 0]])).toBeNull(); // prettier-ignore
  });

  it('is the same whichever reader comes first', () => {
    const table = [[38, 5, 0], [33, 11, 3], [10, 14, 5]]; // prettier-ignore
    const turned = table.map((_, i) => table.map((row) => row[i] ?? 0));
    expect(cohenKappa(turned)?.value).toBeCloseTo(cohenKappa(table)?.value ?? NaN, 12);
  });
});
