import { describe, expect, it } from 'vitest';
import { figureFileName } from '@/components/charts/figure-name';
import { figureRules, variableRule, variablesIn } from '@/components/charts/figure-style';

describe('the name of a downloaded figure', () => {
  it('holds the code of the nest, the figure and the day it speaks for', () => {
    const name = { code: 'N12', figure: 'brood-strips', asOf: '2026-06-16' };
    expect(figureFileName(name, 'svg')).toBe('N12-brood-strips-as-of-2026-06-16.svg');
  });

  it.each([
    ['A/B 7', 'A-B-7'],
    ['../etc', 'etc'],
    ['Ñ 4', 'Ñ-4'],
    ['***', 'nest'],
  ])('makes a file name of the code %s', (code, stem) => {
    expect(figureFileName({ code, figure: 'comb', asOf: '2026-06-16' }, 'png')).toBe(
      `${stem}-comb-as-of-2026-06-16.png`,
    );
  });
});

describe('the style a figure takes along', () => {
  const rules = [
    { cssText: '.comb-cell { color: var(--ink) }', selectorText: '.comb-cell' },
    { cssText: 'p { margin: 0 }', selectorText: 'p' },
    { cssText: '@layer x', cssRules: [{ cssText: '.fig-mono { font: var(--font-mono) }', selectorText: '.fig-mono' }] },
    {
      cssText: '@media print',
      media: {},
      cssRules: [{ cssText: '.comb-cell { color: red }', selectorText: '.comb-cell' }],
    },
  ];

  it('is that of combs and figures, also from inside a layer, but not that of print', () => {
    expect(figureRules(rules)).toEqual(['.comb-cell { color: var(--ink) }', '.fig-mono { font: var(--font-mono) }']);
  });

  it('names every variable once, and gives only those a value that have one', () => {
    const names = variablesIn(figureRules(rules).join(' ') + ' var(--ink)');
    expect(names).toEqual(['--font-mono', '--ink']);
    expect(variableRule(names, (name) => (name === '--ink' ? ' #000 ' : ''))).toBe(':root { --ink: #000; }');
  });
});
