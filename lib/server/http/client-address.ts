import 'server-only';
import { behindProxy } from '@/lib/server/env';

/**
 * The address a request came from, as far as it can be trusted. `X-Forwarded-For` is believed only behind our own
 * proxy, and then only its last entry, which that proxy wrote; without one everything arrives over loopback and
 * counts as one address.
 */
export function clientAddress(headers: Headers): string {
  if (!behindProxy()) return 'direct';
  return headers.get('x-forwarded-for')?.split(',').at(-1)?.trim() || 'direct';
}
