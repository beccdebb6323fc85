import type { Random } from '@/lib/kit/random';

/** A value as JSON can hold it. */
export type Json = null | boolean | number | string | Json[] | { [name: string]: Json };

/** What a slip, a wrong program or malice may put where something else belongs. */
const STRANGE: readonly Json[] = [
  ...[null, true, false, 0, 1, -1, 0.5, 2.5, 7, 41, 1e9, -1e9, 1e308, 5e-324],
  ...[
    '',
    ' ',
    'egg',
    'capped',
    'x',
    '2026-02-30',
    '2026-06-16',
    '2026-06-16T05:35:00Z',
    '\u0000"',
    '__proto__',
    'constructor',
  ],
  ...[[], [null], [[]], {}, { value: 1 }, { value: null }, { __proto__: null, toString: 'no' }],
];

function pick<T>(random: Random, items: readonly T[]): T | undefined {
  return items[Math.floor(random() * items.length)];
}

/** Every place in a value: the holder and the name or number in it. */
function places(value: Json, found: { holder: Json[] | { [name: string]: Json }; key: string }[] = []) {
  if (value === null || typeof value !== 'object') return found;
  for (const key of Object.keys(value)) {
    found.push({ holder: value, key });
    places((value as { [name: string]: Json })[key] ?? null, found);
  }
  return found;
}

/** Changes one place of a value: something strange in it, gone, twice, renamed, or a text or number a little off. */
function mutateOnce(random: Random, value: Json): void {
  const place = pick(random, places(value));
  if (!place) return;
  const { key } = place;
  const holder = place.holder as { [name: string]: Json };
  const old = holder[key] ?? null;
  const kind = random();
  if (kind < 0.45) holder[key] = structuredClone(pick(random, STRANGE) ?? null);
  else if (kind < 0.6) delete holder[key];
  else if (kind < 0.7 && Array.isArray(place.holder)) place.holder.push(structuredClone(old));
  else if (kind < 0.8) holder[`${key}${pick(random, ['', 's', ' ', '0']) ?? ''}`] = structuredClone(old);
  else if (typeof old === 'number') holder[key] = old * (pick(random, [-1, 0.1, 10, 1.0001]) ?? 1);
  else if (typeof old === 'string') holder[key] = old.slice(0, Math.floor(random() * old.length));
  else holder[key] = [structuredClone(old)];
}

/** Breaks a text itself: a character gone, doubled or replaced, or the end cut off. */
function mutateText(random: Random, text: string): string {
  const at = Math.floor(random() * text.length);
  const middle = pick(random, ['', '"', '}', ',', '0', '\\', '\u0000', `${text[at]}${text[at]}`]) ?? '';
  return random() < 0.2 ? text.slice(0, at) : text.slice(0, at) + middle + text.slice(at + 1);
}

/** The text of a file with one to three places changed, and now and then with a broken text. */
export function mutatedFile(random: Random, file: Json): string {
  const changed = structuredClone(file);
  for (let changes = 1 + Math.floor(random() * 3); changes > 0; changes--) mutateOnce(random, changed);
  const text = JSON.stringify(changed);
  return random() < 0.15 ? mutateText(random, text) : text;
}
