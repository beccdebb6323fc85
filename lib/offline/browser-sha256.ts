import type { Sha256 } from '@/lib/protocol/op-hash';

/** SHA-256 by the browser, of UTF-8 text as lower-case hex. */
export const browserSha256: Sha256 = async (text) => {
  const digest = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(text));
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('');
};
