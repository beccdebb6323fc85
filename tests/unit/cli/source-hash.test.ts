import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { sourceHash } from '@/lib/cli/source-hash';

let root: string;

function write(path: string, text: string): void {
  mkdirSync(dirname(join(root, path)), { recursive: true });
  writeFileSync(join(root, path), text);
}

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'undereave-hash-'));
  write('lib/comb/axial.ts', 'a');
  write('public/icon.svg', 'i');
});

afterEach(() => rmSync(root, { recursive: true }));

test('equal sources give equal fingerprints', () => {
  expect(sourceHash(root)).toBe(sourceHash(root));
});

test.each([
  ['a changed file', 'lib/comb/axial.ts', 'b'],
  ['a new file', 'lib/comb/walk.ts', ''],
  ['a new setting', 'next.config.mjs', 'export default {};'],
  ['the service worker builder', 'lib/cli/build-sw.ts', 'x'],
])('%s changes it', (_, path, text) => {
  const before = sourceHash(root);
  write(path, text);
  expect(sourceHash(root)).not.toBe(before);
});

test('moving text from one file to another changes it', () => {
  write('lib/comb/b.ts', 'x');
  const before = sourceHash(root);
  write('lib/comb/axial.ts', 'ax');
  write('lib/comb/b.ts', '');
  expect(sourceHash(root)).not.toBe(before);
});

test.each(['public/sw.js', 'public/field/brood-worker.js', 'tests/unit/a.test.ts', 'README.md'])(
  '%s is not part of the application',
  (path) => {
    const before = sourceHash(root);
    write(path, 'anything');
    expect(sourceHash(root)).toBe(before);
  },
);
