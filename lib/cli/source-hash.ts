import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** What the built application is made from. */
const SOURCES = [
  'app',
  'components',
  'fonts',
  'lib',
  'models',
  'public',
  'workers',
  'next.config.mjs',
  'package-lock.json',
  'postcss.config.mjs',
  'proxy.ts',
  'tailwind.config.ts',
  'tsconfig.json',
];
/** The build writes the workers itself. */
const LEFT_OUT = new Set(['public/sw.js', 'public/sw.js.map', 'public/field/brood-worker.js']);

function filesUnder(root: string, path: string): string[] {
  const full = join(root, path);
  if (!existsSync(full) || LEFT_OUT.has(path)) return [];
  if (statSync(full).isFile()) return [path];
  return readdirSync(full)
    .sort()
    .flatMap((name) => filesUnder(root, `${path}/${name}`));
}

/**
 * A fingerprint of everything the build reads: SHA-256 over names and contents.
 *
 * @param root the project's folder
 */
export function sourceHash(root: string): string {
  const hash = createHash('sha256').update(process.version);
  for (const file of SOURCES.flatMap((path) => filesUnder(root, path))) {
    hash.update(`\0${file}\0`).update(readFileSync(join(root, file)));
  }
  return hash.digest('hex');
}
