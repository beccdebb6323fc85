import { expect, it } from 'vitest';
import { pooledAgreement } from '@/lib/stats/pooled-agreement';

it('agreement over combs adds their cells up before it is a share', () => {
  const pooled = pooledAgreement([
    { n: 200, agreed: 60 },
    { n: 63, agreed: 21 },
  ]);
  expect([pooled?.n, pooled?.agreed]).toEqual([263, 81]);
  // 81 in 263: Newcombe 1998, Statistics in Medicine 17:857–872, Table I.
  expect(pooled?.interval.low).toBeCloseTo(0.2553, 4);
  expect(pooled?.interval.high).toBeCloseTo(0.3662, 4);
});

it('agreement over nothing is no share', () => {
  expect(pooledAgreement([])).toBeNull();
  expect(pooledAgreement([{ n: 0, agreed: 0 }])).toBeNull();
});
