import type { Json } from './canonical-json';
import type { OpCode } from './op-codes';

/** Half of a surrogate pair: databases turn it into a question mark without saying so. */
const LONE_SURROGATE = /[\ud800-\udfff]/u;

/** Control characters other than newline and tab: they break CSV and every screen. */
const CONTROL = /[\u0000-\u0008\u000b-\u001f]/;

/** Is this text without lone surrogates and control characters? */
export function isCleanText(text: string): boolean {
  return !LONE_SURROGATE.test(text) && !CONTROL.test(text);
}

/** Every text in a value, member names too. */
function* textsIn(value: Json): Generator<string> {
  if (typeof value === 'string') yield value;
  if (value === null || typeof value !== 'object') return;
  if (!Array.isArray(value)) yield* Object.keys(value);
  for (const item of Object.values(value)) yield* textsIn(item);
}

/** Checks all texts: `unicode` for a lone surrogate, `control` for a control character. */
export function checkText(value: Json): OpCode | null {
  let code: OpCode | null = null;
  for (const text of textsIn(value)) {
    if (LONE_SURROGATE.test(text)) return 'unicode';
    if (CONTROL.test(text)) code = 'control';
  }
  return code;
}
