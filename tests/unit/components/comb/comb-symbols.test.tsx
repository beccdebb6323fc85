import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { CombKey } from '@/components/comb/comb-key';
import { CombSymbols, MARK_SYMBOLS, STATE_SYMBOLS } from '@/components/comb/comb-symbols';
import { CELL_STATES } from '@/lib/comb/states';

const sprite = renderToStaticMarkup(<CombSymbols />);

describe('the symbol set', () => {
  it('holds one symbol for each of the twelve states and the six marks', () => {
    const ids = [...sprite.matchAll(/<symbol id="([^"]+)"/g)].map(([, id]) => id);
    expect(ids).toHaveLength(18);
    expect(new Set(ids)).toEqual(new Set([...Object.values(STATE_SYMBOLS), ...Object.values(MARK_SYMBOLS)]));
    expect(new Set(CELL_STATES.map((state) => STATE_SYMBOLS[state])).size).toBe(12);
  });

  it('draws glyphs in the colour of the text, so that print and forced colours can change them', () => {
    const colours = [...sprite.matchAll(/(?:fill|stroke)="([^"]+)"/g)].map(([, colour]) => colour ?? '');
    const allowed = /^(none|currentColor|var\(--(cell|outline|halo),(#fff|none|currentColor)\))$/;
    expect(colours.filter((colour) => !allowed.test(colour))).toEqual([]);
  });

  it('carries no inline style, which the content policy would block', () => {
    expect(sprite).not.toContain('style=');
  });
});

describe('the key to the symbols', () => {
  it('explains everything when it is not told what is shown', () => {
    expect(renderToStaticMarkup(<CombKey />).match(/<li/g)).toHaveLength(18);
  });

  it('explains only what the cells show', () => {
    const html = renderToStaticMarkup(<CombKey cells={[{ q: 0, r: 0, state: 'egg', nectar: true }]} />);
    expect(html.match(/<li/g)).toHaveLength(2);
    expect(html).toContain('egg');
    expect(html).toContain('nectar');
  });
});
