import { describe, expect, it } from 'vitest';
import { floorOf, percentWords, trendWords } from '@/components/charts/share-trend';

const point = (month: string, share: number, low: number) => ({ month, share, interval: { low, high: 0.97 }, n: 33 });

describe('a chart of shares', () => {
  it('is said in words: first and last month, with intervals and n', () => {
    expect(trendWords('Senna', [point('2026-06', 0.88, 0.73), point('2026-07', 0.9, 0.8)])).toBe(
      'Senna: from June 2026 88 % (73 % to 97 %, 33 cells) to July 2026 90 % (80 % to 97 %, 33 cells).',
    );
    expect(trendWords('Senna', [])).toBe('Senna: nothing to compare.');
  });

  it('begins at half only while every interval is above it', () => {
    expect(floorOf([point('2026-06', 0.88, 0.73)])).toBe(0.5);
    expect(floorOf([point('2026-06', 0.88, 0.73), point('2026-07', 0.6, 0.4)])).toBe(0);
  });

  it('rounds to whole percents', () => {
    expect(percentWords(29 / 33)).toBe('88 %');
  });
});
