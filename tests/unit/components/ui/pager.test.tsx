import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Pager } from '@/components/ui/pager';

const draw = (page: number, pages: number) =>
  renderToStaticMarkup(<Pager page={page} pages={pages} summary="60 nests" hrefOf={(to) => `/nests?page=${to}`} />);

describe('the pager', () => {
  it('shows only the count when everything is on one page', () => {
    expect(draw(1, 1)).not.toContain('<a');
    expect(draw(1, 1)).toContain('60 nests');
  });

  it('leads both ways from a page in the middle', () => {
    const html = draw(2, 3);
    expect(html).toContain('href="/nests?page=1"');
    expect(html).toContain('href="/nests?page=3"');
    expect(html).toContain('page 2 of 3');
  });

  it('has no way past either end', () => {
    expect(draw(1, 3)).not.toContain('rel="prev"');
    expect(draw(3, 3)).not.toContain('rel="next"');
  });
});
