import 'server-only';
import { publicUrl } from '@/lib/server/env';

/**
 * An address within this product, made absolute; null for every other one, malformed ones included.
 * Resolving it the way a browser does catches `//host`, `/\host` and `javascript:`.
 */
export function ownUrl(text: string): string | null {
  const own = new URL(publicUrl());
  try {
    const url = new URL(text, own);
    return url.origin === own.origin ? url.href : null;
  } catch {
    return null;
  }
}
