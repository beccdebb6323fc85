import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { NestDatesDrawing } from '@/components/charts/nest-dates-drawing';
import { type BroodStrip, StripsDrawing } from '@/components/charts/strips-drawing';

const spread = (median: string, lo: string, hi: string) => ({
  median,
  p50: [lo, hi] as const,
  p80: [lo, hi] as const,
  p95: [lo, hi] as const,
});

const strip: BroodStrip = {
  key: '0',
  label: 'cell 0',
  short: '0',
  state: 'capped',
  laid: spread('2026-05-09', '2026-05-05', '2026-05-13'),
  capped: spread('2026-06-09', '2026-06-06', '2026-06-12'),
  emerges: spread('2026-06-23', '2026-06-18', '2026-06-29'),
};

const draw = (strips: readonly BroodStrip[], asOf = '2026-06-16', width = 900) =>
  renderToStaticMarkup(<StripsDrawing strips={strips} asOf={asOf} width={width} />);

describe('brood strips', () => {
  it('draw one strip a row: light until capping, dark until emergence', () => {
    const html = draw([strip, { ...strip, key: '1' }]);
    expect(html.match(/fill="var\(--stage-small\)"/g)).toHaveLength(2);
    expect(html.match(/fill="var\(--fig-capped\)"/g)).toHaveLength(2);
  });

  it('give each of the three dates three lines, the narrower the range the thicker', () => {
    const html = draw([strip]);
    expect(html.match(/stroke-width="6.5"/g)).toHaveLength(3);
    expect(html.match(/stroke-width="3.5"/g)).toHaveLength(3);
  });

  it('leave the dark part out when emergence is not known', () => {
    expect(draw([{ ...strip, emerges: null }])).not.toContain('fig-capped');
  });

  it('mark the day they speak for, unless it lies far off the chart', () => {
    expect(draw([strip])).toContain('16 June');
    expect(draw([strip], '2026-12-01')).not.toContain('1 December');
  });

  it('carry the glyph of what was seen, and cut a long label but keep it whole in its title', () => {
    const html = draw(
      [{ ...strip, label: 'cells 1, 3, 5, 7, 9, 11, 13, 15', short: '1, 3, 5, 7, 9' }],
      '2026-06-16',
      380,
    );
    expect(html).toContain('#st-capped');
    expect(html).toContain('<title>cells 1, 3, 5, 7, 9, 11, 13, 15</title>');
    expect(html).toMatch(/>1, 3, 5…</);
  });

  it('draw nothing without brood', () => {
    expect(draw([])).toBe('');
  });
});

describe("the line of the nest's own dates", () => {
  it('holds every range and a mark for each reading on it', () => {
    const dates = [{ label: 'Founded', spread: spread('2026-05-06', '2026-04-29', '2026-05-13') }];
    const visits = ['2026-05-10', '2026-09-01'];
    const html = renderToStaticMarkup(<NestDatesDrawing dates={dates} visits={visits} asOf="2026-05-12" width={700} />);
    expect(html).toContain('Founded');
    expect(html.match(/<path/g)).toHaveLength(1);
  });

  it('is left out when nothing can be dated', () => {
    const html = renderToStaticMarkup(<NestDatesDrawing dates={[]} visits={[]} asOf="2026-05-12" width={700} />);
    expect(html).toBe('');
  });
});
