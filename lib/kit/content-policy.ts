/** What a page's scripts may be, besides files of this site. */
export interface PolicySources {
  /** Value on the page's own inline scripts; null for pages written once at build time. */
  nonce: string | null;
  /** `sha256-…` of inline scripts of such pages. */
  scriptHashes: readonly string[];
  /** The development server needs eval and inline styles for its reloading. */
  development: boolean;
}

/**
 * The Content-Security-Policy of a page: files, connections and workers of this site only, no plug-ins, no framing,
 * no inline style attributes. Without `strict-dynamic`, because pages built ahead carry hashes and no nonce.
 */
export function contentPolicy({ nonce, scriptHashes, development }: PolicySources): string {
  const scripts = [
    "'self'",
    ...(nonce === null ? [] : [`'nonce-${nonce}'`]),
    ...(development
      ? ["'unsafe-eval'", ...(nonce === null ? ["'unsafe-inline'"] : [])]
      : scriptHashes.map((hash) => `'${hash}'`)),
  ];
  return [
    "default-src 'self'",
    `script-src ${scripts.join(' ')}`,
    `style-src 'self'${development ? " 'unsafe-inline'" : ''}`,
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "manifest-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

const HASH = /^sha256-[A-Za-z0-9+/]{43}=$/;

/** The script hashes in a list that was read from a file; anything else in it is left out. */
export function scriptHashes(list: unknown): string[] {
  return Array.isArray(list)
    ? list.filter((entry): entry is string => typeof entry === 'string' && HASH.test(entry))
    : [];
}
