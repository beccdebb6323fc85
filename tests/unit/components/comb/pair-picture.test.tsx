import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { PairPicture } from '@/components/comb/pair-picture';

const drawn = (pairs: Parameters<typeof PairPicture>[0]['pairs']) =>
  renderToStaticMarkup(<PairPicture pairs={pairs} label="Both" />);

describe('one comb laid over another', () => {
  it('draws what both see once, and what they see differently as both glyphs in a doubled outline', () => {
    const html = drawn([
      { q: 0, r: 0, field: 'egg', lab: 'egg' },
      { q: 1, r: 0, field: 'small', lab: 'medium' },
      { q: 2, r: 0, field: 'capped', lab: null },
    ]);
    expect(html.match(/comb-differs-line/g)).toHaveLength(2);
    expect(html.match(/cell-egg"/g)).toHaveLength(1);
    expect(html.match(/cell-small"/g)).toHaveLength(1);
    expect(html.match(/cell-medium"/g)).toHaveLength(1);
    expect(html.match(/cell-capped"/g)).toHaveLength(1);
  });

  it.each([1, 7, 61, 500])('draws a comb of %i cells', (count) => {
    const pairs = Array.from(
      { length: count },
      (_, q) => ({ q: q % 40, r: Math.floor(q / 40), field: 'egg', lab: 'egg' }) as const,
    );
    expect(drawn(pairs).match(/data-cell/g)).toHaveLength(count);
  });
});
