import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { broodRows } from '@/components/lab/brood-rows';
import { BroodTable } from '@/components/lab/brood-table';
import type { CellEstimate, DateRange } from '@/lib/brood/answer';

const range = (median: string, lo: string, hi: string): DateRange => {
  const spread = { median, p50: [lo, hi], p80: [lo, hi], p95: [lo, hi] } satisfies Omit<DateRange, 'utc'>;
  return { ...spread, utc: spread };
};

const estimate = (q: number, r: number, laid: DateRange | null): CellEstimate => ({
  q,
  r,
  state: laid ? 'egg' : 'empty',
  generation: laid ? 1 : 0,
  laid,
  capped: null,
  emerges: null,
  lost: { probability: 0 },
});

const early = range('2026-05-10', '2026-05-05', '2026-05-15');
const late = range('2026-06-10', '2026-06-05', '2026-06-15');

describe('the strips of a nest', () => {
  const rows = broodRows([estimate(0, -2, late), estimate(1, 0, early), estimate(0, 0, early), estimate(0, 1, null)]);

  it('put cells with equal dates together, oldest brood first, cells in order', () => {
    expect(rows.map(({ cells }) => cells)).toEqual([[0, 3], [7]]);
  });

  it('leave out cells without brood', () => {
    expect(rows.flatMap(({ cells }) => cells)).not.toContain(4);
  });

  it('say every date with its range in the table', () => {
    const html = renderToStaticMarkup(<BroodTable rows={rows} inYear="2026" />);
    expect(html).toContain('<strong class="whitespace-nowrap">10 May</strong>, between 5 and 15 May');
    expect(html).toContain('not known');
  });
});
