import { createHash } from 'node:crypto';

const INLINE_SCRIPT = /<script(?![^>]*\ssrc=)[^>]*>([\s\S]*?)<\/script>/g;

/**
 * The Content-Security-Policy hashes (`sha256-…`) of a page's inline scripts. A page that comes from a cache cannot
 * carry a nonce, so its scripts are known by what they say.
 */
export function inlineScriptHashes(html: string): string[] {
  const scripts = [...html.matchAll(INLINE_SCRIPT)].map(([, text = '']) => text).filter((text) => text !== '');
  const hashes = scripts.map((text) => `sha256-${createHash('sha256').update(text, 'utf8').digest('base64')}`);
  return [...new Set(hashes)];
}
