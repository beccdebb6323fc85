import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { BroodStrips, type BroodStrip } from '@/components/charts/brood-strips';

const strip: BroodStrip = {
  key: '0',
  label: 'cell 0',
  laid: { median: '2026-05-09', range: ['2026-05-05', '2026-05-13'] },
  capped: '2026-06-09',
  emerges: { median: '2026-06-23', range: ['2026-06-18', '2026-06-29'] },
};

const draw = (strips: readonly BroodStrip[], asOf = '2026-06-16') =>
  renderToStaticMarkup(<BroodStrips strips={strips} asOf={asOf} />);

describe('brood strips', () => {
  it('draw one strip a row: light until capping, dark until emergence', () => {
    const html = draw([strip, { ...strip, key: '1' }]);
    expect(html.match(/fill="var\(--stage-small\)"/g)).toHaveLength(2);
    expect(html.match(/fill="var\(--stage-capped\)"/g)).toHaveLength(2);
  });

  it('leave the dark part out when emergence is not known', () => {
    expect(draw([{ ...strip, emerges: null }])).not.toContain('stage-capped');
  });

  it('mark the day they speak for, unless it lies far off the chart', () => {
    expect(draw([strip])).toContain('16 June');
    expect(draw([strip], '2026-12-01')).not.toContain('1 December');
  });

  it('draw nothing without brood', () => {
    expect(draw([])).toBe('');
  });
});
