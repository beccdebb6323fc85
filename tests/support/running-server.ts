import { port } from '@/lib/server/env';

/** The address of the server that all browser tests share, without a trailing slash. */
export function origin(): string {
  return `http://127.0.0.1:${port()}`;
}
