/** Rules of the page that figures need: their own classes, those of combs, and nothing else. */
const FIGURE_RULE = /^\.(?:comb|cell|age|fig)-[\w-]+/;
const VARIABLE = /var\((--[\w-]+)/g;

/** The part of a style rule that is looked at; `cssRules` where it holds others. */
export interface RuleLike {
  cssText: string;
  selectorText?: string;
  cssRules?: ArrayLike<RuleLike>;
  /** Given by rules for some media only. */
  media?: unknown;
}

/** The texts of all rules that figures need, in the order of the sheet; those for print or other media are left out. */
export function figureRules(rules: ArrayLike<RuleLike>): string[] {
  return Array.from(rules).flatMap((rule) => {
    if (rule.media) return [];
    if (rule.selectorText !== undefined) return FIGURE_RULE.test(rule.selectorText) ? [rule.cssText] : [];
    return rule.cssRules ? figureRules(rule.cssRules) : [];
  });
}

/** The names of all variables a text uses. */
export function variablesIn(text: string): string[] {
  return [...new Set(Array.from(text.matchAll(VARIABLE), ([, name = '']) => name))].sort();
}

/** Gives variables their values, as one rule for the root of a drawing. */
export function variableRule(names: readonly string[], valueOf: (name: string) => string): string {
  const set = names.map((name) => [name, valueOf(name).trim()] as const).filter(([, value]) => value !== '');
  return `:root { ${set.map(([name, value]) => `${name}: ${value};`).join(' ')} }`;
}
