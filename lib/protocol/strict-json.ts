import { type Result, err, ok } from '@/lib/kit/result';
import type { Json } from './canonical-json';

/** Deeper JSON than this is refused before it can exhaust the stack. */
export const MAX_JSON_DEPTH = 64;

/** Why a text was refused. */
export type StrictJsonError = 'json' | 'dup-key';

/** A parsed text. */
export interface StrictJson {
  value: Json;
  /** For each member of the top object that is a list: the raw text of every element, as it came. */
  rawItems: ReadonlyMap<string, readonly string[]>;
}

const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const STRING = /"(?:[^"\\\u0000-\u001f]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*"/y;
const SPACE = /[ \t\n\r]*/y;
const WORDS: readonly [string, Json][] = [
  ['true', true],
  ['false', false],
  ['null', null],
];

class Refused extends Error {
  constructor(readonly code: StrictJsonError) {
    super(code);
  }
}

/** One pass over a text; `at` is the next character to read. */
class Reader {
  private at = 0;
  readonly rawItems = new Map<string, string[]>();

  constructor(private readonly text: string) {}

  /** The whole text as one value with nothing after it. */
  document(): Json {
    const value = this.value(0, null);
    this.space();
    if (this.at < this.text.length) throw new Refused('json');
    return value;
  }

  private space(): void {
    SPACE.lastIndex = this.at;
    SPACE.exec(this.text);
    this.at = SPACE.lastIndex;
  }

  private match(pattern: RegExp): string {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text)?.[0];
    if (found === undefined) throw new Refused('json');
    this.at += found.length;
    return found;
  }

  /** Takes a character if it is next. */
  private took(character: string): boolean {
    this.space();
    if (this.text[this.at] !== character) return false;
    this.at += 1;
    return true;
  }

  private expect(character: string): void {
    if (!this.took(character)) throw new Refused('json');
  }

  private string(): string {
    this.space();
    const text: unknown = JSON.parse(this.match(STRING));
    return String(text);
  }

  private word(): Json {
    for (const [word, value] of WORDS) {
      if (!this.text.startsWith(word, this.at)) continue;
      this.at += word.length;
      return value;
    }
    return Number(this.match(NUMBER));
  }

  /** @param name the top object's member that this value belongs to, when it is one. */
  private value(depth: number, name: string | null): Json {
    if (depth > MAX_JSON_DEPTH) throw new Refused('json');
    this.space();
    const next = this.text[this.at];
    if (next === '{') return this.object(depth);
    if (next === '[') return this.list(depth, name);
    return next === '"' ? this.string() : this.word();
  }

  private object(depth: number): Json {
    const members: { [key: string]: Json } = {};
    this.expect('{');
    if (this.took('}')) return members;
    do {
      const key = this.string();
      if (Object.hasOwn(members, key)) throw new Refused('dup-key');
      this.expect(':');
      const value = this.value(depth + 1, depth === 0 ? key : null);
      // Defined, not assigned: `__proto__` must become a member like any other.
      Object.defineProperty(members, key, { value, enumerable: true, configurable: true, writable: true });
    } while (this.took(','));
    this.expect('}');
    return members;
  }

  private list(depth: number, name: string | null): Json[] {
    const items: Json[] = [];
    const raw: string[] = [];
    this.expect('[');
    if (!this.took(']')) {
      do {
        this.space();
        const start = this.at;
        items.push(this.value(depth + 1, null));
        if (name !== null) raw.push(this.text.slice(start, this.at));
      } while (this.took(','));
      this.expect(']');
    }
    if (name !== null) this.rawItems.set(name, raw);
    return items;
  }
}

/**
 * Parses JSON more strictly than `JSON.parse`: a member named twice is an error, not an overwrite; depth is bounded;
 * `__proto__` is a plain member. Numbers too large for a double come back as Infinity, for the checks to refuse.
 *
 * @returns the value with the raw text of list elements, or `json` / `dup-key`.
 */
export function parseStrictJson(text: string): Result<StrictJson, StrictJsonError> {
  const reader = new Reader(text);
  try {
    const value = reader.document();
    return ok({ value, rawItems: reader.rawItems });
  } catch (error) {
    if (error instanceof Refused) return err(error.code);
    throw error;
  }
}
