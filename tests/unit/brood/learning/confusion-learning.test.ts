import { describe, expect, it } from 'vitest';
import { type SettledCell, learnConfusion } from '@/lib/brood/learning/confusion-learning';
import { DEFAULT_CONFUSION, rowSum } from '@/lib/brood/team-settings/confusion-rows';
import { seededRandom } from '@/lib/kit/random';

const cells = (count: number, cell: SettledCell): SettledCell[] => Array<SettledCell>(count).fill(cell);
const learn = (seen: readonly SettledCell[], pseudoCount = 50) => learnConfusion(seen, DEFAULT_CONFUSION, pseudoCount);

describe('reader confusion from double readings', () => {
  it('is the mean of the Dirichlet posterior, (prior × weight + cells) / (weight + n), worked by hand', () => {
    const eggs = [
      ...cells(40, { truth: 'egg', instar: null, seen: 'egg' }),
      ...cells(10, { truth: 'egg', instar: null, seen: 'empty' }),
    ];
    const [row, ...others] = learn(eggs);
    expect(others).toEqual([]);
    expect(row).toMatchObject({ name: 'egg', n: 50, counts: { egg: 40, empty: 10 } });
    // (0.94·50 + 40) / 100, (0.05·50 + 10) / 100, 0.01·50 / 100.
    expect(row?.posterior.egg).toBeCloseTo(0.87, 12);
    expect(row?.posterior.empty).toBeCloseTo(0.125, 12);
    expect(row?.posterior.small).toBeCloseTo(0.005, 12);
  });

  it('gives a class the default never had its share, and every row adds up to 1', () => {
    const rows = learn([
      ...cells(3, { truth: 'capped', instar: null, seen: 'opened' }),
      ...cells(5, { truth: 'small', instar: null, seen: 'egg' }),
    ]);
    expect(rows.find(({ name }) => name === 'pupa')?.posterior.opened).toBeCloseTo(3 / 53, 12);
    for (const { posterior } of rows) expect(rowSum(posterior)).toBeCloseTo(1, 12);
  });

  it('shares a small larva out over instars 1 to 3 by how likely each makes what was seen', () => {
    // Seen as egg: L1 0.03, L2 0, L3 0, so all of it is L1. Seen as small: 0.97, 1 and 0.95.
    expect(learn(cells(4, { truth: 'small', instar: null, seen: 'egg' })).map(({ name, n }) => [name, n])).toEqual([
      ['L1', 4],
    ]);
    const shared = learn(cells(292, { truth: 'small', instar: null, seen: 'small' }));
    expect(shared.map(({ name, n }) => [name, Number(n.toFixed(9))])).toEqual([
      ['L1', 97],
      ['L2', 100],
      ['L3', 95],
    ]);
  });

  it('counts a cell for its own instar where a reviewer gave it', () => {
    expect(learn(cells(7, { truth: 'small', instar: 3, seen: 'medium' })).map(({ name, n }) => [name, n])).toEqual([
      ['L3', 7],
    ]);
  });

  it('comes to the truth with many cells, whatever the default said (seed 11)', () => {
    const random = seededRandom(11);
    const seen = Array.from({ length: 20_000 }, (): SettledCell => {
      const draw = random();
      if (draw < 0.7) return { truth: 'large', instar: null, seen: 'large' };
      return { truth: 'large', instar: null, seen: draw < 0.9 ? 'medium' : 'capped' };
    });
    const row = learn(seen)[0]?.posterior;
    // Three standard errors of a share of 0.7 in 20,000 cells are 0.0097.
    expect(Math.abs((row?.large ?? 0) - 0.7)).toBeLessThan(0.012);
    expect(Math.abs((row?.medium ?? 0) - 0.2)).toBeLessThan(0.012);
  });

  it('says nothing without cells', () => {
    expect(learn([])).toEqual([]);
  });
});
