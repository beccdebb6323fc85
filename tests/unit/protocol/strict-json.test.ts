import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/lib/kit/random';
import type { Json } from '@/lib/protocol/canonical-json';
import { MAX_JSON_DEPTH, parseStrictJson } from '@/lib/protocol/strict-json';

function valueOf(text: string): Json {
  const parsed = parseStrictJson(text);
  if (!parsed.ok) throw new Error(parsed.error);
  return parsed.value.value;
}

function errorOf(text: string): string | null {
  const parsed = parseStrictJson(text);
  return parsed.ok ? null : parsed.error;
}

function randomJson(random: () => number, depth: number): Json {
  const pick = Math.floor(random() * (depth > 3 ? 5 : 7));
  if (pick === 0) return null;
  if (pick === 1) return random() < 0.5;
  if (pick === 2) return Math.floor((random() - 0.5) * 2e6);
  if (pick === 3) return (random() - 0.5) * 10 ** Math.floor(random() * 40 - 20);
  if (pick === 4) return String.fromCharCode(...Array.from({ length: 5 }, () => Math.floor(random() * 0x300)));
  const items = Array.from({ length: Math.floor(random() * 5) }, () => randomJson(random, depth + 1));
  if (pick === 5) return items;
  return Object.fromEntries(
    items.map((item, index) => [`${index}${String.fromCharCode(34 + Math.floor(random() * 90))}`, item]),
  );
}

describe('the strict JSON reader', () => {
  it('reads what JSON.parse reads (500 random texts, seed 8259)', () => {
    const random = seededRandom(8259);
    for (let round = 0; round < 500; round++) {
      const json = randomJson(random, 0);
      const text = round % 2 ? JSON.stringify(json) : JSON.stringify(json, null, 2);
      expect(valueOf(text)).toEqual(JSON.parse(text));
    }
  });

  it.each([
    '',
    ' ',
    '{',
    '[1,]',
    '{"a":1,}',
    '{a:1}',
    "{'a':1}",
    '[01]',
    '[1.]',
    '[.5]',
    '[+1]',
    '[0x10]',
    '[1e]',
    '[--1]',
    'nul',
    'nulll',
    'true false',
    '[1] x',
    '"a',
    '"\\x"',
    '"\\u12g4"',
    '"a\nb"',
    '"\u0001"',
    '[NaN]',
    '[Infinity]',
    '[-Infinity]',
    '{"a" 1}',
    '[1 2]',
    '/* */1',
    '\ufeff1',
    '\u00a01',
    '[\u0661]',
  ])('refuses what is not JSON: %j', (text) => {
    expect(errorOf(text)).toBe('json');
  });

  it('refuses a member named twice, also when spelled differently or deep inside', () => {
    expect(errorOf('{"opId":"a","opId":"b"}')).toBe('dup-key');
    expect(errorOf('{"a":1,"\\u0061":2}')).toBe('dup-key');
    expect(errorOf('{"ops":[{"body":{"q":1,"q":1}}]}')).toBe('dup-key');
    expect(errorOf('{"__proto__":1,"__proto__":2}')).toBe('dup-key');
  });

  it('keeps __proto__ and constructor as plain members and leaves prototypes alone', () => {
    const value = valueOf('{"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}}}');
    expect(Object.keys(value ?? {})).toEqual(['__proto__', 'constructor']);
    expect(Object.getPrototypeOf(value)).toBe(Object.prototype);
    expect('polluted' in {}).toBe(false);
  });

  it('refuses JSON nested 100,000 deep without exhausting the stack', () => {
    expect(errorOf('['.repeat(100_000) + ']'.repeat(100_000))).toBe('json');
    expect(errorOf('{"a":'.repeat(100_000))).toBe('json');
    expect(errorOf('['.repeat(MAX_JSON_DEPTH + 1) + ']'.repeat(MAX_JSON_DEPTH + 1))).toBeNull();
    expect(errorOf('['.repeat(MAX_JSON_DEPTH + 2) + ']'.repeat(MAX_JSON_DEPTH + 2))).toBe('json');
  });

  it('hands on numbers out of range for the checks to refuse', () => {
    expect(valueOf('[1e309, -1e309]')).toEqual([Infinity, -Infinity]);
    expect(valueOf('9007199254740993')).toBe(9007199254740992);
  });

  it('hands on lone surrogates for the checks to refuse', () => {
    expect(valueOf('"\\ud800"')).toBe('\ud800');
  });

  it('keeps the text of every element of a list in the top object, exactly as it came', () => {
    const parsed = parseStrictJson('{ "ops" : [ {"a": 1.50} ,"x" , [ 1,2 ],null ], "n": {"ops": [7]}, "e": [] }');
    if (!parsed.ok) throw new Error(parsed.error);
    expect(parsed.value.rawItems.get('ops')).toEqual(['{"a": 1.50}', '"x"', '[ 1,2 ]', 'null']);
    expect(parsed.value.rawItems.get('e')).toEqual([]);
    expect([...parsed.value.rawItems.keys()]).toEqual(['ops', 'e']);
  });

  it.each([
    ['a text as long as a whole body', `["${'a'.repeat(262_000)}"]`, null],
    ['one that never ends', `["${'a'.repeat(262_000)}`, 'json'],
    ['one of escapes alone', `["${'\\n'.repeat(131_000)}"]`, null],
    ['a number of as many digits', '1'.repeat(262_000), null],
  ])('is not brought down by %s', (_what, text, error) => {
    expect(errorOf(text)).toBe(error);
  });

  it('reads a quarter of a megabyte of short strings in well under a second', () => {
    const text = `[${Array(40_000).fill('"ab"').join(',')}]`;
    const start = performance.now();
    expect(errorOf(text)).toBeNull();
    expect(performance.now() - start).toBeLessThan(1_000);
  });
});
