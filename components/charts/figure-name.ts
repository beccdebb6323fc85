/** What a figure's file is called after. */
export interface FigureName {
  /** The nest's code. */
  code: string;
  /** Which figure: `brood-strips`. */
  figure: string;
  /** The day it speaks for, `YYYY-MM-DD`. */
  asOf: string;
}

/** The name of a downloaded figure: `N12-brood-strips-as-of-2026-06-16.svg`. Signs no file system takes become hyphens. */
export function figureFileName({ code, figure, asOf }: FigureName, type: 'svg' | 'png'): string {
  const plain = code.replace(/[^\p{L}\p{N}._-]+/gu, '-').replace(/^[-.]+|-+$/g, '');
  return `${plain || 'nest'}-${figure}-as-of-${asOf}.${type}`;
}
