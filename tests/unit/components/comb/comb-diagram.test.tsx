import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { CombDiagram, type CombDiagramProps } from '@/components/comb/comb-diagram';
import { CombPicture } from '@/components/comb/comb-picture';
import type { CombCellView } from '@/components/comb/comb-view';
import { ring, spiral } from '@/lib/comb/walk';

const cells: CombCellView[] = spiral(7).map((cell, index) => ({ ...cell, state: 'egg', nectar: index === 2 }));

const draw = (props: Partial<CombDiagramProps> = {}) =>
  renderToStaticMarkup(<CombDiagram cells={cells} label="Comb of N12" {...props} />);

const count = (html: string, part: string) => html.split(part).length - 1;

describe('the comb as a grid', () => {
  it('is one grid of rows of named cells', () => {
    const html = draw();
    expect(html).toContain('role="grid" aria-label="Comb of N12"');
    expect(count(html, 'role="row"')).toBe(3);
    expect(count(html, 'role="gridcell"')).toBe(7);
    expect(html).toContain('aria-label="cell 2, ring 1, egg, nectar"');
  });

  it('is a single stop of the Tab key: the first cell, or the one at work', () => {
    expect(count(draw(), 'tabindex="0"')).toBe(1);
    expect(draw()).toMatch(/aria-label="cell 0, [^"]*" aria-selected="false" tabindex="0"/);
    expect(draw({ current: { q: 0, r: 1 } })).toMatch(/aria-label="cell 4, [^"]*" aria-selected="true" tabindex="0"/);
  });

  it('offers free places on the rim by name', () => {
    const html = draw({ ghosts: ring(2) });
    expect(count(html, 'data-ghost')).toBe(12);
    expect(html).toContain('aria-label="add cell 7, ring 2"');
  });

  it('always says where 12 is and from which side it is seen', () => {
    expect(draw()).toContain('from below');
    expect(draw({ mirrored: true })).toContain('from above, mirrored');
    expect(draw()).toContain('12');
  });

  it('bears the pedicel’s nub only when the pedicel cell is there', () => {
    expect(draw()).toContain('comb-nub');
    expect(draw({ cells: ring(1).map((cell) => ({ ...cell, state: 'egg' as const })) })).not.toContain('comb-nub');
  });

  it('doubles the outline of cells that differ', () => {
    expect(count(draw({ differs: [{ q: 0, r: 0 }] }), 'comb-differs-line')).toBe(1);
  });

  it('leaves small marks out of cells below 20 pixels', () => {
    expect(draw({ cellSize: 20 })).toContain('#mk-nectar');
    expect(draw({ cellSize: 19 })).not.toContain('#mk-nectar');
  });

  it('shows a window of seven cells when asked', () => {
    const html = draw({ viewWindow: { centre: { q: 0, r: 0 }, across: 7, down: 7 }, sizing: 'fill' });
    expect(html).toMatch(/viewBox="-139 /);
    expect(html).not.toMatch(/<svg[^>]*width="/);
  });

  it('carries no inline style, which the content policy would block', () => {
    expect(draw({ ghosts: ring(2), current: { q: 0, r: 0 } })).not.toContain('style=');
  });
});

describe('the comb as a picture', () => {
  it('says its tally instead of offering cells to the keyboard', () => {
    const html = renderToStaticMarkup(<CombPicture cells={cells} label="7 cells: 7 eggs" />);
    expect(html).toContain('role="img" aria-label="7 cells: 7 eggs"');
    expect(html).not.toContain('tabindex');
    expect(count(html, 'data-cell')).toBe(7);
  });
});
