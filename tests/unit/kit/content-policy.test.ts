import { describe, expect, it } from 'vitest';
import { contentPolicy, scriptHashes } from '@/lib/kit/content-policy';

const hash = `sha256-${'A'.repeat(43)}=`;

/** The sources of one directive. */
function sources(policy: string, directive: string): string[] {
  const found = policy.split('; ').find((part) => part.startsWith(`${directive} `));
  return found?.split(' ').slice(1) ?? [];
}

describe('the content policy of a page', () => {
  it('lets a page made on request run its own scripts by nonce, and those of built pages by hash', () => {
    const policy = contentPolicy({ nonce: 'abc', scriptHashes: [hash], development: false });
    expect(sources(policy, 'script-src')).toEqual(["'self'", "'nonce-abc'", `'${hash}'`]);
  });

  it('lets a built page run scripts by hash alone', () => {
    const policy = contentPolicy({ nonce: null, scriptHashes: [hash], development: false });
    expect(sources(policy, 'script-src')).toEqual(["'self'", `'${hash}'`]);
  });

  it('allows no inline style, no eval, no frame and no plug-in where it counts', () => {
    const policy = contentPolicy({ nonce: 'abc', scriptHashes: [], development: false });
    expect(policy).not.toContain('unsafe');
    expect(sources(policy, 'style-src')).toEqual(["'self'"]);
    expect(sources(policy, 'frame-ancestors')).toEqual(["'none'"]);
    expect(sources(policy, 'object-src')).toEqual(["'none'"]);
    expect(sources(policy, 'base-uri')).toEqual(["'none'"]);
  });

  it('relaxes only for the development server', () => {
    expect(contentPolicy({ nonce: null, scriptHashes: [], development: true })).toContain("'unsafe-eval'");
  });
});

describe('the hashes read from the build', () => {
  it('are only well-formed ones, so that the file cannot widen the policy', () => {
    expect(scriptHashes([hash, "'unsafe-inline'", `${hash}; script-src *`, 7])).toEqual([hash]);
    expect(scriptHashes({ field: [hash] })).toEqual([]);
  });
});
