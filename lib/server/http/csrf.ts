import 'server-only';
import { SYNC_HEADER } from '@/lib/protocol/limits';
import { publicUrl } from '@/lib/server/env';

const CHANGES: ReadonlySet<string> = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/** Does the browser say that another site made this request? A request without an `Origin` is not foreign. */
export function isForeign(request: Request): boolean {
  const origin = request.headers.get('origin');
  if (origin !== null && origin !== new URL(publicUrl()).origin) return true;
  return request.headers.get('sec-fetch-site') === 'cross-site';
}

/**
 * May this request be one that another site tricked the browser into? Besides foreign ones that is any changing
 * request without `X-Sync: 1`, a header that a form cannot set.
 */
export function mayBeForged(request: Request): boolean {
  if (isForeign(request)) return true;
  return CHANGES.has(request.method) && request.headers.get(SYNC_HEADER) !== '1';
}
