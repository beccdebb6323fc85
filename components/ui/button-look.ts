/** What a button is for: the one main act, any other act, an act that ends something, or one that hardly matters. */
export type ButtonTone = 'main' | 'plain' | 'stop' | 'quiet';

/** Lab controls are dense; field controls are for gloves. */
export type ButtonSize = 'lab' | 'field';

const BASE =
  'inline-flex items-center justify-center gap-2 rounded border-2 text-center font-bold no-underline ' +
  'disabled:cursor-not-allowed disabled:border-rule disabled:bg-wash disabled:text-quiet ' +
  'aria-disabled:cursor-not-allowed aria-disabled:border-rule aria-disabled:bg-wash aria-disabled:text-quiet';

const TONES: Readonly<Record<ButtonTone, string>> = {
  main: 'border-main bg-main text-main-on hover:border-ink',
  plain: 'border-ink bg-paper text-ink hover:bg-wash',
  stop: 'border-stop bg-paper text-stop hover:bg-stop-wash',
  quiet: 'border-transparent bg-transparent text-main underline underline-offset-4 hover:bg-wash',
};

const SIZES: Readonly<Record<ButtonSize, string>> = {
  lab: 'min-h-9 px-3.5 py-1 text-base',
  field: 'min-h-field px-5 py-2 text-field',
};

/** The classes of a button or of a link that looks like one. */
export function buttonLook(tone: ButtonTone, size: ButtonSize, className = ''): string {
  return `${BASE} ${TONES[tone]} ${SIZES[size]} ${className}`.trim();
}
