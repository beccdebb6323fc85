import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

/** The part of package-lock.json that is read. */
interface LockFile {
  packages: Record<string, { version?: string; resolved?: string; hasInstallScript?: boolean }>;
}

/**
 * The oldest version of a package that may be installed anywhere in the tree. Next.js: the advisories of August 2026
 * (image optimiser, CVE-2026-75604), fixed in 16.3.3. sharp: the image decoders of that same report, 0.35.4.
 * next-auth: the last line of version 4 that accepts this Next.js, 4.24.15. Raise a number when an advisory says so.
 */
const OLDEST: Readonly<Record<string, string>> = {
  next: '16.3.3',
  sharp: '0.35.4',
  'next-auth': '4.24.15',
};

const { packages } = JSON.parse(readFileSync('package-lock.json', 'utf8')) as LockFile;

/** Every installed copy of a package, also those inside other packages. */
function copiesOf(name: string): string[] {
  return Object.keys(packages).filter(
    (path) => path === `node_modules/${name}` || path.endsWith(`/node_modules/${name}`),
  );
}

/** Is version `a` at least version `b`? A pre-release counts as older than its release. */
function atLeast(a: string, b: string): boolean {
  const [numbers = '', preRelease] = a.split('-', 2);
  const left = numbers.split('.').map(Number);
  const right = b.split('.').map(Number);
  const at = left.findIndex((part, index) => part !== right[index]);
  if (at === -1) return preRelease === undefined;
  return (left[at] ?? 0) > (right[at] ?? 0);
}

describe('installed versions', () => {
  test.each(Object.entries(OLDEST))('%s is nowhere older than %s', (name, oldest) => {
    const old = copiesOf(name).filter((path) => !atLeast(packages[path]?.version ?? '0', oldest));
    expect(old).toEqual([]);
  });

  test.each(['next', 'next-auth'])('%s is really there, so that the gate has something to look at', (name) => {
    expect(packages[`node_modules/${name}`]?.version).toMatch(/^\d+\.\d+\.\d+$/);
  });

  test('the comparison knows older, equal, newer and pre-releases apart', () => {
    expect(
      ['16.3.2', '16.3.3', '16.4.0', '17.0.0', '9.9.9', '16.3.3-beta.1'].map((version) => atLeast(version, '16.3.3')),
    ).toEqual([false, true, true, true, false, false]);
  });

  test('every dependency of ours is pinned to one version', () => {
    const { dependencies, devDependencies } = JSON.parse(readFileSync('package.json', 'utf8')) as Record<
      string,
      Record<string, string>
    >;
    const loose = Object.entries({ ...dependencies, ...devDependencies }).filter(
      ([, version]) => !/^\d+\.\d+\.\d+$/.test(version),
    );
    expect(loose).toEqual([]);
  });
});
