import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type NextRequest, NextResponse } from 'next/server';
import { contentPolicy, scriptHashes } from '@/lib/kit/content-policy';

const development = process.env.NODE_ENV === 'development';

let known: string[] | null = null;

/** Hashes of the inline scripts of the pages built ahead (the phone app and the not-found page), written by the build. */
function builtHashes(): string[] {
  if (known) return known;
  try {
    known = scriptHashes(JSON.parse(readFileSync(join(process.cwd(), '.next', 'field-csp.json'), 'utf8')));
  } catch {
    // A development server has no built pages; a build without the file shows at once, because the phone app stays blank.
    known = [];
  }
  return known;
}

/** Is this the phone app, which is one page built ahead and kept on the phone? */
function isFieldPath(path: string): boolean {
  return path === '/field' || path.startsWith('/field/');
}

/**
 * Gives every page its Content-Security-Policy. Pages made on request carry a fresh nonce, which Next reads from the
 * request's own header; the phone app comes from a cache, so its scripts are known by hash.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = isFieldPath(request.nextUrl.pathname) ? null : btoa(crypto.randomUUID());
  const policy = contentPolicy({ nonce, scriptHashes: builtHashes(), development });
  const headers = new Headers(request.headers);
  headers.set('Content-Security-Policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  return response;
}

/** All pages. Left out: the API, whose large bodies a proxy would cut off, and files that are no documents. */
export const config = {
  matcher: ['/((?!api/|_next/|icons/|sw\\.js$|field/brood-worker\\.js$|favicon\\.ico$|manifest\\.webmanifest$).*)'],
};
