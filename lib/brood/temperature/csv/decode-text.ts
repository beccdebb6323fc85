/** Byte order marks of the two kinds of UTF-16. */
const UTF_16: readonly [mark: readonly [number, number], name: string][] = [
  [[0xff, 0xfe], 'utf-16le'],
  [[0xfe, 0xff], 'utf-16be'],
];

/**
 * The text of a file a logger's program wrote: UTF-8 or UTF-16 where it is that, otherwise the western code page, in
 * which the sign of the degree is one byte.
 */
export function decodeText(bytes: Uint8Array): string {
  const wide = UTF_16.find(([[first, second]]) => bytes[0] === first && bytes[1] === second);
  if (wide) return new TextDecoder(wide[1]).decode(bytes);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}
