import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { packagesOutdated } from '@/lib/cli/installed-packages.mjs';

let root: string;

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'undereave-packages-'));
  const packages = {
    '': { name: 'x' },
    'node_modules/zod': { version: '4.6.7' },
    'node_modules/@img/sharp-darwin-arm64': { version: '1.0.0', optional: true },
  };
  writeFileSync(join(root, 'package-lock.json'), JSON.stringify({ packages }));
});

afterEach(() => rmSync(root, { recursive: true }));

function installed(packages: object): void {
  mkdirSync(join(root, 'node_modules'), { recursive: true });
  writeFileSync(join(root, 'node_modules', '.package-lock.json'), JSON.stringify({ packages }));
}

test('a fresh clone has nothing installed', () => {
  expect(packagesOutdated(root)).toMatch(/not installed yet/);
});

test('an installation that was cut short has no record, so it counts as nothing', () => {
  mkdirSync(join(root, 'node_modules', 'zod'), { recursive: true });
  expect(packagesOutdated(root)).toMatch(/not installed yet/);
});

test('what the lock file asks for is enough, packages for other machines left out', () => {
  installed({ 'node_modules/zod': { version: '4.6.7' } });
  expect(packagesOutdated(root)).toBeNull();
});

test('another version than the lock file asks for is out of date', () => {
  installed({ 'node_modules/zod': { version: '4.6.6' } });
  expect(packagesOutdated(root)).toBe('zod should be 4.6.7');
});

test('a package missing from the installation is out of date', () => {
  installed({});
  expect(packagesOutdated(root)).toBe('zod should be 4.6.7');
});
