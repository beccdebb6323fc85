const UUID_TEXT = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/**
 * Is this lower-case UUID text (RFC 9562 form, any version)?
 * Upper case, braces and other spellings are refused: one id has one spelling.
 */
export function isUuidText(value: unknown): value is string {
  return typeof value === 'string' && UUID_TEXT.test(value);
}

/** The 16 bytes of a UUID text. The caller has checked it with `isUuidText`. */
export function uuidToBytes(text: string): Uint8Array {
  const hex = text.replaceAll('-', '');
  const bytes = new Uint8Array(16);
  for (let i = 0; i < 16; i++) bytes[i] = Number.parseInt(hex.slice(2 * i, 2 * i + 2), 16);
  return bytes;
}

/** The lower-case text of 16 UUID bytes. */
export function bytesToUuid(bytes: Uint8Array): string {
  let hex = '';
  for (const byte of bytes) hex += byte.toString(16).padStart(2, '0');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
